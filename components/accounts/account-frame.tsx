import type { ReactNode } from "react";
import { PublicFrame } from "@/components/accounts/public-frame";
import { SignOutButton } from "@/components/accounts/sign-out-button";

/** Around what is the person's own and no organisation's. */
export function AccountFrame({ name, children }: { name: string; children: ReactNode }) {
  return (
    <PublicFrame
      aside={
        <div className="flex items-center gap-4 text-deep-soft">
          <span className="hidden sm:inline">{name}</span>
          <SignOutButton />
        </div>
      }
    >
      {children}
    </PublicFrame>
  );
}
