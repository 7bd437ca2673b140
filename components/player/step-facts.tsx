import { CautionPlate } from "@/components/ui/caution";
import { Tag, Value } from "@/components/ui/tag";
import { formatTightening } from "@/lib/core/steps/parse-tightening";
import type { StepFacts } from "@/lib/core/steps/types";

/** What one step needs to be known of: cautions first, then values with their source. */
export function StepFactsView({ facts, withCautions = true }: { facts: StepFacts; withCautions?: boolean }) {
  const lists: [string, string[]][] = [
    ["Tools", facts.tools],
    ["Parts", facts.parts],
    ["Fluids", facts.fluids.map((fluid) => `${fluid.kind}${fluid.amount ? `, ${fluid.amount}` : ""}`)],
  ];
  return (
    <div className="grid gap-3">
      {withCautions && facts.cautions.map((caution) => <CautionPlate key={caution.id} caution={caution} />)}
      {facts.fasteners.length > 0 && <Fasteners facts={facts} />}
      {lists.map(
        ([name, items]) =>
          items.length > 0 && (
            <p key={name}>
              <span className="font-plate text-[1.1rem] font-semibold">{name}: </span>
              {items.join(" · ")}
            </p>
          ),
      )}
      {facts.faultCodes.length > 0 && (
        <p>
          <span className="font-plate text-[1.1rem] font-semibold">Fault codes: </span>
          {facts.faultCodes.map((code) => (
            <Value key={code} className="mr-3">
              {code}
            </Value>
          ))}
        </p>
      )}
    </div>
  );
}

function Fasteners({ facts }: { facts: StepFacts }) {
  return (
    <ul className="grid gap-2">
      {facts.fasteners.map((fastener) => (
        <li key={fastener.id} className="border-b border-rule pb-2 last:border-b-0">
          <div className="flex flex-wrap items-baseline justify-between gap-x-4">
            <span>
              {fastener.name} ×{fastener.count}
              {fastener.acrossFlatsMm !== null && <span className="text-ink2">, {fastener.acrossFlatsMm} mm across flats</span>}{" "}
              {fastener.oneTimeUse && <Tag>new each time</Tag>}
            </span>
            {fastener.tightening && <Value className="text-[1.3rem] font-semibold">{formatTightening(fastener.tightening)}</Value>}
          </div>
          {fastener.tightening && <p className="text-sm text-ink2">Source: {fastener.tightening.source || "not given"}</p>}
        </li>
      ))}
    </ul>
  );
}
