import { frontBrakes } from "@/db/seeds/demo/tasks/front-brakes";
import { auxiliaryBelt, batteryDrain, clutchHydraulics, coolingPressureTest, wheelBearing } from "@/db/seeds/demo/tasks/outlined";
import { drumBrakes, headlampAim, liftInduction, refrigerantRecovery, roadWheel, serviceInspection, tyrePressureSensor } from "@/db/seeds/demo/tasks/small";
import type { TaskContent } from "@/lib/core/tasks/types";

/** The demo's practical tasks by key, in the order of a plate. Every value in them is invented. */
export const DEMO_TASKS = {
  "lift-induction": liftInduction,
  "road-wheel": roadWheel,
  "front-brake-discs": frontBrakes,
  "rear-drum-brakes": drumBrakes,
  "wheel-bearing": wheelBearing,
  "tyre-pressure-sensor": tyrePressureSensor,
  "auxiliary-belt": auxiliaryBelt,
  "cooling-pressure-test": coolingPressureTest,
  "battery-drain": batteryDrain,
  "clutch-hydraulics": clutchHydraulics,
  "headlamp-aim": headlampAim,
  "refrigerant-recovery": refrigerantRecovery,
  "service-inspection": serviceInspection,
} as const satisfies Record<string, TaskContent>;

export type DemoTaskKey = keyof typeof DEMO_TASKS;
