import type { Metadata } from "next";
import Link from "next/link";
import { AccountFrame } from "@/components/accounts/account-frame";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { EmptyPlace } from "@/components/ui/notice";
import { requireSignedIn } from "@/lib/http/page";
import { listPosts } from "@/lib/services/frame/view-frame";

export const metadata: Metadata = { title: "Where you work" };

/** For somebody of several organisations: where to go to work now, and as what. */
export default async function OrganisationsPage() {
  const signedIn = await requireSignedIn("/o");
  const posts = await listPosts(signedIn.personId);
  return (
    <AccountFrame name={signedIn.name}>
      <Page narrow>
        <PageHead title="Where to?" next="Choose where you work now. You can change over at any time from the menu with your name." />
        {posts.length === 0 ? (
          <EmptyPlace title="You belong to no organisation now">
            Your account stays. Ask your workshop or college to invite {signedIn.email}; what was recorded about you is kept.
          </EmptyPlace>
        ) : (
          <Sheet>
            <ul>
              {posts.map((post) => (
                <li key={post.key} className="border-b border-rule last:border-b-0">
                  <Link href={post.href} className="flex min-h-16 flex-col justify-center px-5 py-3 sm:flex-row sm:items-center sm:justify-between hover:bg-tint">
                    <span className="text-[1.1rem] font-semibold">{post.organisation}</span>
                    <span className="font-plate text-[1.2rem] font-semibold text-strong">{post.roleLabel}</span>
                  </Link>
                </li>
              ))}
            </ul>
          </Sheet>
        )}
      </Page>
    </AccountFrame>
  );
}
