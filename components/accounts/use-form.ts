"use client";

import { useRef, useState, type SubmitEvent } from "react";
import { refusalOf, type Refusal } from "@/components/accounts/refusal";

/**
 * A form that asks the server and shows what it says. What was typed stays in the fields when it is refused, and a second press while
 * the first is under way does nothing.
 * @param send  gets the form's fields; the form stays busy after it has succeeded, since the page is then on its way elsewhere, unless
 *              it resolves to "again"
 */
export function useForm(send: (form: FormData) => Promise<void | "again">) {
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const underWay = useRef(false);
  async function onSubmit(event: SubmitEvent<HTMLFormElement>) {
    event.preventDefault();
    if (underWay.current) return;
    underWay.current = true;
    setBusy(true);
    setRefusal(null);
    try {
      if ((await send(new FormData(event.currentTarget))) === "again") stop();
    } catch (error) {
      stop();
      setRefusal(refusalOf(error));
    }
  }
  function stop() {
    underWay.current = false;
    setBusy(false);
  }
  // Before the script is there a press must not put a password into the address: the form's own method is POST, to nowhere.
  return { busy, refusal, formProps: { onSubmit, method: "post" as const, noValidate: true } };
}
