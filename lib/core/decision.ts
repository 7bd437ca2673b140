import { AppError } from "@/lib/core/errors";

/** A policy's answer: who may do it, or the sentence that says why not. */
export type Decision = { allowed: true } | { allowed: false; reason: string };

export const allow: Decision = { allowed: true };
export const deny = (reason: string): Decision => ({ allowed: false, reason });

/** @throws AppError("forbidden") with the decision's reason. */
export function assertAllowed(decision: Decision): void {
  if (!decision.allowed) throw new AppError("forbidden", decision.reason);
}
