type Choice<Value extends string> = { value: Value; label: string; strong?: boolean };

type SegmentedProps<Value extends string> = {
  /** Read by screen readers as the group's name. */
  legend: string;
  name: string;
  value: Value | null;
  choices: readonly Choice<Value>[];
  onChange: (value: Value) => void;
  disabled?: boolean;
  /** Pixels; 48 for a sheet held in one hand. */
  height?: number;
};

/** A few choices side by side, radio buttons underneath: arrow keys, one large press each. */
export function Segmented<Value extends string>({ legend, name, value, choices, onChange, disabled = false, height = 48 }: SegmentedProps<Value>) {
  return (
    <fieldset disabled={disabled} className="flex overflow-hidden rounded border-[1.5px] border-strong">
      <legend className="sr-only">{legend}</legend>
      {choices.map((choice) => (
        <label
          key={choice.value}
          style={{ minHeight: height }}
          className={`flex flex-1 cursor-pointer items-center justify-center border-r-[1.5px] border-strong px-1 text-center font-plate text-[1.2rem] font-semibold leading-tight last:border-r-0 has-focus-visible:outline-3 has-focus-visible:-outline-offset-4 ${
            choice.value === value ? (choice.strong ? "bg-ink text-chalk" : "bg-strong text-strong-ink") : "bg-chalk text-strong"
          }`}
        >
          <input
            type="radio"
            className="sr-only"
            name={name}
            value={choice.value}
            checked={choice.value === value}
            onChange={() => onChange(choice.value)}
          />
          {choice.label}
        </label>
      ))}
    </fieldset>
  );
}
