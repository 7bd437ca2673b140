import { asked, criticalRule, found, inspected, measured, seen, set, torque } from "@/db/seeds/demo/tasks/criteria";
import type { TaskContent } from "@/lib/core/tasks/types";

const STAR = { critical: true };

/** Twelve criteria; the two that aren't required keep the rule "at least ten of twelve". Every value is invented for the demo. */
export const frontBrakes: TaskContent = {
  title: "Renew front pads and discs, one axle",
  shortTitle: "Front discs",
  area: "Brakes",
  conditions: "Shop vehicle, maker's sheet given, 150 minutes, mentor in sight. Demo values are invented.",
  criteria: [
    seen("C1", "Support", "Checks the lift's date, sets the pads, push test at 100 mm, locks on", "All four seen, in this order.", STAR),
    seen("C2", "Support", "Protects lungs, eyes and hands; controls dust without an air line", "Mask, goggles and wet wipe throughout."),
    measured(
      "C3",
      "Measure",
      "Zeroes the micrometer and takes eight readings, 45° apart, 10 mm in",
      "Zero error at most 0.01 mm; each reading within 0.02 mm of the assessor's.",
      found("disc thickness, lowest of eight", "mm", { lower: 22, resolution: 0.01, instrument: "micrometer" }),
    ),
    asked("C4", "Measure", "Decides from limit and variation, by axle", "Both reasons said: below the limit, or varying by more than 0.015 mm.", STAR),
    seen("C5", "Strip", "Supports the calliper, hose slack, and inspects the hose", "Never hanging, at no moment.", STAR),
    seen("C6", "Strip", "Finds the cause of the uneven pads and proves the cure", "The pin moves by hand afterwards.", { optional: true }),
    measured(
      "C7",
      "Fit",
      "Cleans the hub face and measures its run-out",
      "Bare metal, and at most 0.02 mm, or the right conclusion said.",
      found("hub face run-out", "mm", { upper: 0.02, resolution: 0.01, instrument: "dial gauge" }),
    ),
    measured(
      "C8",
      "Fit",
      "Fitted disc run-out; turns the disc on the hub if needed",
      "At most 0.05 mm, within 0.01 mm of the assessor's.",
      set("fitted disc run-out", "mm", { upper: 0.05, resolution: 0.01, instrument: "dial gauge" }),
    ),
    measured("C9", "Tighten", "New carrier bolts, right wrench, in date", "105 N·m ±4 %, bolts new.", torque(105), STAR),
    measured("C10", "Tighten", "Slide-pin bolts; boots seated; grease in the right place", "28 N·m ±4 %, no grease on anything that rubs.", torque(28)),
    measured("C11", "Finish", "Pumps the pedal before moving; level; wheel bolts on the ground, in star order", "Pedal hard first, then 115 N·m ±4 %.", torque(115), STAR),
    inspected("C12", "Finish", "Measurement sheet and card complete; says who releases; asks for a licensed driver", "Every box filled, both oral questions answered.", { optional: true }),
  ],
  rule: criticalRule({ evidencePhotos: 3 }),
};
