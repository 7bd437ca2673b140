import { AppError } from "@/lib/core/errors";

/**
 * @param near   what is near to the person, such as their name: a password made of it is guessed first
 * @param field  the field to name
 * @throws AppError("invalid_input") with the reason
 */
export function assertGoodPassword(password: string, near: readonly string[], field = "password"): void {
  if ([...password].length >= 15 && !near.includes(password)) return;
  const message = "Use at least 15 characters.";
  throw new AppError("invalid_input", message, [{ path: field, message }]);
}
