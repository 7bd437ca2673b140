import { Fragment } from "react";
import { BENCH_KEYS } from "@/components/bench/keys";
import { KeyCap } from "@/components/ui/tag";

const HEADINGS = [...new Set(BENCH_KEYS.map(({ about }) => about))];

/** All keys on one sheet. */
export function KeysSheet() {
  return (
    <div className="grid gap-x-8 gap-y-4 sm:grid-cols-2">
      {HEADINGS.map((heading) => (
        <section key={heading}>
          <h3 className="mb-1 border-b border-rule text-[1.15rem]">{heading}</h3>
          <dl className="grid grid-cols-[6.5rem_1fr] gap-x-3 gap-y-1.5">
            {BENCH_KEYS.filter(({ about }) => about === heading).map(({ keys, words }) => (
              <Fragment key={words}>
                <dt className="flex flex-wrap items-start gap-1">
                  {keys.map((key) => (
                    <KeyCap key={key}>{key}</KeyCap>
                  ))}
                </dt>
                <dd>{words}</dd>
              </Fragment>
            ))}
          </dl>
        </section>
      ))}
      <p className="text-sm text-ink2 sm:col-span-2">Keys rest while you type. Every act has a button too.</p>
    </div>
  );
}
