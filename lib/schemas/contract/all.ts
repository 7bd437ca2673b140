import type { z } from "zod";
import { accountsDoors } from "@/lib/schemas/contract/accounts";
import { assignmentsDoors } from "@/lib/schemas/contract/assignments";
import { cohortsDoors } from "@/lib/schemas/contract/cohorts";
import type { FileAnswer } from "@/lib/schemas/contract/door-spec";
import { markingDoors } from "@/lib/schemas/contract/marking";
import { modulesDoors } from "@/lib/schemas/contract/modules";
import { observationsDoors } from "@/lib/schemas/contract/observations";
import { peopleDoors } from "@/lib/schemas/contract/people";
import { recordingsDoors } from "@/lib/schemas/contract/recordings";
import { tasksDoors } from "@/lib/schemas/contract/tasks";
import { uploadsDoors } from "@/lib/schemas/contract/uploads";

/** Every door under /api/v1, keyed by "METHOD /path". */
export const CONTRACT = {
  ...accountsDoors,
  ...peopleDoors,
  ...uploadsDoors,
  ...recordingsDoors,
  ...markingDoors,
  ...modulesDoors,
  ...assignmentsDoors,
  ...tasksDoors,
  ...observationsDoors,
  ...cohortsDoors,
} as const;

export type Contract = typeof CONTRACT;
export type DoorKey = keyof Contract;

type Shape<S, Name extends string, Kind extends "in" | "out"> = S extends Record<Name, infer T>
  ? T extends z.ZodType
    ? Kind extends "in"
      ? z.input<T>
      : z.output<T>
    : undefined
  : undefined;

/** What the caller sends and what the service is given, for one door. */
export type DoorParams<K extends DoorKey> = Shape<Contract[K], "params", "out">;
export type DoorQuery<K extends DoorKey> = Shape<Contract[K], "query", "out">;
export type DoorBody<K extends DoorKey> = Shape<Contract[K], "body", "out">;
export type DoorBodyIn<K extends DoorKey> = Shape<Contract[K], "body", "in">;
export type DoorQueryIn<K extends DoorKey> = Shape<Contract[K], "query", "in">;

/** What comes back: the parsed JSON, or the file's text. */
export type DoorAnswer<K extends DoorKey> = Contract[K]["response"] extends FileAnswer
  ? Response
  : Contract[K]["response"] extends z.ZodType
    ? z.output<Contract[K]["response"]>
    : never;
/** What a service hands to the wrapper to be checked and stripped. */
export type DoorResult<K extends DoorKey> = Contract[K]["response"] extends FileAnswer
  ? Response
  : Contract[K]["response"] extends z.ZodType
    ? z.input<Contract[K]["response"]>
    : never;
