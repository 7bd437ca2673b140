import type { Metadata } from "next";
import Link from "next/link";
import { AccountFrame } from "@/components/accounts/account-frame";
import { ChangePasswordForm } from "@/components/accounts/change-password-form";
import { Devices } from "@/components/accounts/devices";
import { ThemeChoice } from "@/components/accounts/theme-choice";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { requireSignedIn } from "@/lib/http/page";
import { viewAccount } from "@/lib/services/accounts/view-account";

export const metadata: Metadata = { title: "Your account" };

export default async function AccountPage() {
  const account = await viewAccount(await requireSignedIn("/account"));
  const devices = account.sessions.map(({ createdAt, lastSeenAt, ...session }) => ({
    ...session,
    since: createdAt.toISOString(),
    lastSeen: lastSeenAt.toISOString(),
  }));
  return (
    <AccountFrame name={account.name}>
      <Page narrow>
        <PageHead title="Your account" next={`${account.name}, ${account.email}`} />
        <div className="grid gap-5">
          <Sheet>
            <SheetPart title="Where you work">
              {account.posts.length === 0 ? (
                <p className="text-ink2">You belong to no organisation now. Ask your workshop or college to invite {account.email}.</p>
              ) : (
                <ul>
                  {account.posts.map((post) => (
                    <li key={post.key}>
                      <Link href={post.href} className="flex min-h-14 flex-col justify-center rounded sm:flex-row sm:items-center sm:justify-between hover:bg-tint">
                        <span className="font-semibold">{post.organisation}</span>
                        <span className="font-plate text-[1.15rem] font-semibold text-strong">{post.roleLabel}</span>
                      </Link>
                    </li>
                  ))}
                </ul>
              )}
            </SheetPart>
          </Sheet>
          <Sheet>
            <SheetPart title="Where you are signed in">
              <Devices devices={devices} />
            </SheetPart>
          </Sheet>
          <Sheet>
            <SheetPart title="Password">
              <ChangePasswordForm email={account.email} />
            </SheetPart>
          </Sheet>
          <Sheet>
            <SheetPart title="Colours of this device">
              <div className="max-w-md">
                <ThemeChoice />
              </div>
            </SheetPart>
          </Sheet>
        </div>
      </Page>
    </AccountFrame>
  );
}
