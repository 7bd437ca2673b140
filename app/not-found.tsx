import Link from "next/link";
import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";

export default function NotFound() {
  return (
    <PublicFrame>
      <NarrowSheet title="There is nothing at this address" next="It may have been put away, or it belongs to an organisation that you are not part of.">
        <p>
          <Link href="/" className="underline underline-offset-4">
            Back to the beginning
          </Link>
        </p>
      </NarrowSheet>
    </PublicFrame>
  );
}
