export const LEDGER_KINDS = ["sign_off", "correction", "withdrawal", "module_revision", "task_revision"] as const;
export type LedgerKind = (typeof LEDGER_KINDS)[number];
