import { AppError } from "@/lib/core/errors";
import { passwordProblem } from "@/lib/core/passwords/password-problem";

/**
 * @param near   what is near to the person, such as their name: a password made of it is guessed first
 * @param field  the field to name
 * @throws AppError("invalid_input") with the reason
 */
export function assertGoodPassword(password: string, near: readonly string[], field = "password"): void {
  const message = passwordProblem(password, near);
  if (message) throw new AppError("invalid_input", message, [{ path: field, message }]);
}
