import { sha256Hex } from "@/lib/core/ledger/bytes";
import { canonicalJson } from "@/lib/core/ledger/canonical-json";
import type { ModuleContent } from "@/lib/core/modules/types";
import type { TaskContent } from "@/lib/core/tasks/types";

/**
 * What a published revision is known by: SHA-256 of its canonical JSON. It covers the work (steps, facts, questions, criteria, rules)
 * and names recordings by id, so that blurring a face or adding a rendition later doesn't change it.
 * @returns 64 hex digits
 */
export function revisionHash(content: ModuleContent | TaskContent): string {
  return sha256Hex(canonicalJson(content));
}
