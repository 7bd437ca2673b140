import { caution, facts, fastener } from "@/db/seeds/demo/films/facts";
import type { StepFacts } from "@/lib/core/steps/types";

export const CAUTIONS = {
  raised: caution(
    "danger",
    "W019",
    "A car that slips off its pads crushes and kills whoever is under it.",
    "Push test at 100 mm, locks engaged, nobody inside or underneath.",
  ),
  dust: caution("caution", "M016", "Brake dust harms your lungs.", "Wear a mask, wipe wet, and never use the air line."),
  eyes: caution("warning", "M004", "Brake fluid and springs can blind an eye.", "Goggles on before you open anything."),
  hose: caution(
    "caution",
    "W001",
    "A calliper that hangs by its hose tears the hose inside, and the brake can fail on the road.",
    "Hook the calliper up, and leave the hose slack.",
  ),
  grease: caution(
    "warning",
    "W001",
    "Grease on a disc or a pad takes the brake away.",
    "Grease the pins only, and wipe every surface that rubs.",
  ),
  pedal: caution(
    "danger",
    "W001",
    "The first press goes to the floor, and the car will not stop.",
    "Pump the pedal until it is hard, before the car moves.",
  ),
};

const TORQUE_LOW = "Torque wrench TW-1, 5–50 N·m";
const TORQUE_HIGH = "Torque wrench TW-2, 20–200 N·m";

export const STEP_FACTS: Record<string, StepFacts> = {
  A1: facts({ tools: ["Micrometer 0–25 mm", "Dial gauge with clamp", TORQUE_LOW, TORQUE_HIGH, "Wire brush", "Calliper hook", "Piston tool"] }),
  A2: facts({
    tools: ["Two-post lift, examination in date", "Breaker bar", "Socket 17 mm"],
    fasteners: [fastener("Wheel bolt", 5, null, { acrossFlatsMm: 17 })],
    cautions: [CAUTIONS.raised],
  }),
  A3: facts({
    tools: ["Micrometer 0–25 mm", "Dial gauge with clamp", "Wheel bolts with spacers", "Spray bottle and wipes"],
    cautions: [CAUTIONS.dust],
  }),
  A4: facts({
    tools: ["Calliper hook", "Piston tool", "Socket 13 mm", "Socket 18 mm", "Screwdriver bit for the disc screw"],
    fasteners: [
      fastener("Slide-pin bolt", 2, null, { acrossFlatsMm: 13 }),
      fastener("Carrier bolt", 2, null, { acrossFlatsMm: 18, oneTimeUse: true }),
      fastener("Disc screw", 1, null),
    ],
    cautions: [CAUTIONS.eyes, CAUTIONS.hose],
  }),
  A5: facts({
    tools: ["Wire brush", "Straight edge", "Dial gauge with clamp", "Micrometer 0–25 mm", TORQUE_LOW],
    parts: ["Front brake disc, 24.0 mm new: two, by axle"],
    fluids: [{ kind: "Brake cleaner", amount: "as needed" }],
    fasteners: [fastener("Disc screw", 1, 10)],
  }),
  A6: facts({
    tools: [TORQUE_LOW, TORQUE_HIGH, "Paint pen"],
    parts: ["Front pad set with wear sensor", "Carrier bolts: two a side, new", "Retaining clips, if weak"],
    fluids: [{ kind: "Silicone grease for slide pins", amount: "a thin film" }],
    fasteners: [
      fastener("Carrier bolt", 2, 105, { acrossFlatsMm: 18, oneTimeUse: true }),
      fastener("Slide-pin bolt", 2, 28, { acrossFlatsMm: 13 }),
    ],
    cautions: [CAUTIONS.grease],
  }),
  A7: facts({
    tools: [TORQUE_HIGH, "Socket 17 mm", "Roller brake tester"],
    fluids: [{ kind: "Brake fluid as named on the cap, fresh", amount: "to MAX" }],
    fasteners: [fastener("Wheel bolt", 5, 115, { acrossFlatsMm: 17 })],
    cautions: [CAUTIONS.pedal],
    faultCodes: ["C0035", "P0504"],
  }),
};
