import type { Chosen } from "@/components/bench/chosen";
import type { Question } from "@/lib/core/questions/types";
import { formatClock } from "@/lib/core/webvtt/timestamps";

type QuestionLaneProps = { durationMs: number; widthPx: number; questions: Question[]; chosen: Chosen; onChoose: (chosen: Chosen) => void };

/** Nearer than this, two pins would cover each other. */
const APART_PX = 27;

/** Questions as pins, square where safety-critical; where they crowd, every other one hangs lower. */
export function QuestionLane({ durationMs, widthPx, questions, chosen, onChoose }: QuestionLaneProps) {
  const rows = rowsOf(questions.map(({ atMs }) => (atMs / durationMs) * widthPx));
  return (
    <div className="relative h-15 border-b border-rule">
      {questions.map((question, index) => {
        const on = chosen?.kind === "question" && chosen.id === question.id;
        const words = question.prompt || "not written yet";
        return (
          <button
            key={question.id}
            type="button"
            aria-pressed={on}
            aria-label={`Question ${index + 1} at ${formatClock(question.atMs)}: ${words}${question.safetyCritical ? ", safety-critical" : ""}`}
            title={words}
            onClick={() => onChoose({ kind: "question", id: question.id })}
            style={{ left: `${(question.atMs / durationMs) * 100}%` }}
            className={`absolute flex h-full w-7 -translate-x-1/2 justify-center py-0.5 ${rows[index] === 1 ? "items-end" : "items-start"} ${on ? "z-10" : ""}`}
          >
            <span
              className={`grid size-6.5 place-items-center border-2 font-plate text-[1rem] font-semibold leading-none ${question.safetyCritical ? "rounded" : "rounded-full"} ${
                on ? "border-line bg-chalk text-ink" : "border-ink bg-ink text-chalk"
              }`}
            >
              {index + 1}
            </span>
          </button>
        );
      })}
    </div>
  );
}

function rowsOf(places: number[]): (0 | 1)[] {
  const last: [number, number] = [-Infinity, -Infinity];
  return places.map((x) => {
    const row = x - last[0] >= APART_PX || last[0] < last[1] ? 0 : 1;
    last[row] = x;
    return row;
  });
}
