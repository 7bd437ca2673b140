import type { Refusal } from "@/components/accounts/refusal";
import { Notice } from "@/components/ui/notice";

/** The sentence of a refusal above a form; left out where a field says the very same. */
export function Refused({ refusal }: { refusal: Refusal | null }) {
  if (!refusal || Object.values(refusal.fields).includes(refusal.sentence)) return null;
  return <Notice kind="error" title={refusal.sentence} />;
}
