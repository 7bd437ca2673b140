"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";

/** A press that changes something: sends it, then shows the page as it stands now. */
export function usePress<Input, Output>(send: (input: Input) => Promise<Output>, after?: (output: Output) => void) {
  const router = useRouter();
  return useMutation({
    mutationFn: send,
    onSuccess: (output) => {
      after?.(output);
      router.refresh();
    },
  });
}
