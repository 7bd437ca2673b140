import { demoId } from "@/db/seeds/demo/demo-id";
import { NO_FACTS, type Caution, type Fastener, type StepFacts } from "@/lib/core/steps/types";

/** Every tightening value of the demo says this of itself. */
export const INVENTED = "Invented for the demo. Never use on a real vehicle; the maker's data rules.";

/** A fastener whose tightening value is invented and says so. @param newtonMetres null: no value is given in this step */
export function fastener(
  name: string,
  count: number,
  newtonMetres: number | null,
  more: { acrossFlatsMm?: number; oneTimeUse?: boolean } = {},
): Fastener {
  return {
    id: demoId(`fastener/${name}/${newtonMetres ?? "loosen"}`),
    name,
    count,
    acrossFlatsMm: more.acrossFlatsMm ?? null,
    oneTimeUse: more.oneTimeUse ?? false,
    tightening: newtonMetres === null ? null : { entered: `${newtonMetres} Nm`, newtonMetres, angleDegrees: null, source: INVENTED },
  };
}

const GRADE_NOTE = "The maker's data and local rules come first.";

/** A caution in the demo's rule of wording: `hazard` names the hazard and the harm, `instruction` what to do. */
export function caution(grade: Caution["grade"], sign: string, hazard: string, instruction: string): Caution {
  return { id: demoId(`caution/${hazard}`), grade, sign, hazard, instruction: `${instruction} ${GRADE_NOTE}`, waitSeconds: null };
}

export const facts = (some: Partial<StepFacts>): StepFacts => ({ ...NO_FACTS, ...some });
