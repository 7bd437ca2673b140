import { caution, facts, fastener } from "@/db/seeds/demo/films/facts";
import type { StepFacts } from "@/lib/core/steps/types";

export const CAUTIONS = {
  starts: caution(
    "danger",
    "W024",
    "A fan or an engine that starts by itself takes fingers with it.",
    "Engine off, key out and locked away, before a hand goes in.",
  ),
  sprung: caution(
    "warning",
    "W024",
    "The tensioner is sprung, and if the bar slips it breaks a hand.",
    "Turn it slowly with both hands on the bar, and pin it before you let go.",
  ),
  running: caution(
    "danger",
    "W024",
    "A running belt pulls in sleeves, hair and rags, and the hand goes with them.",
    "Sleeves tight, nothing loose, guards on, and stand back from the belt.",
  ),
};

const TORQUE = "Torque wrench TW-2, 20–200 N·m";

export const STEP_FACTS: Record<string, StepFacts> = {
  B1: facts({ tools: ["Multimeter MM-1", "Fault code reader", "Lamp"], faultCodes: ["P0562"] }),
  B2: facts({ tools: ["Key box with lock", "Pencil and card"], cautions: [CAUTIONS.starts] }),
  B3: facts({
    tools: ["Long bar, 15 mm", "Tensioner pin, 5 mm"],
    fasteners: [fastener("Tensioner bolt", 1, null, { acrossFlatsMm: 15 })],
    cautions: [CAUTIONS.sprung],
  }),
  B4: facts({
    tools: ["Straight edge", "Feeler gauges", TORQUE],
    parts: ["Tensioner", "Idler, if it is rough"],
    fasteners: [fastener("Tensioner bolt", 1, 45, { acrossFlatsMm: 15 }), fastener("Idler bolt", 1, 40, { acrossFlatsMm: 15 })],
  }),
  B5: facts({
    tools: ["Belt frequency meter", "Multimeter MM-1", "Fault code reader"],
    parts: ["Auxiliary belt, six ribs"],
    cautions: [CAUTIONS.running],
    faultCodes: ["P0562"],
  }),
};
