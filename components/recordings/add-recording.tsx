"use client";

import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { addUploads } from "@/components/upload/running-uploads";

/** Where films come in: picked, dropped, or filmed now on a phone. */
export function AddRecording({ org, isFirst }: { org: string; isFirst: boolean }) {
  const picker = useRef<HTMLInputElement>(null);
  const camera = useRef<HTMLInputElement>(null);
  const [isOver, setIsOver] = useState(false);
  const add = (files: FileList | null) => {
    if (files && files.length > 0) addUploads(org, [...files]);
  };
  const picked = (event: React.ChangeEvent<HTMLInputElement>) => {
    add(event.target.files);
    // So that the same file can be picked again.
    event.target.value = "";
  };
  return (
    <div
      className={`grid justify-items-start gap-3 rounded border-[1.5px] border-dashed px-5 py-5 ${isOver ? "border-strong bg-tint" : "border-steel"}`}
      onDragOver={(event) => {
        event.preventDefault();
        setIsOver(true);
      }}
      onDragLeave={() => setIsOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setIsOver(false);
        add(event.dataTransfer.files);
      }}
    >
      <h2 className="text-[1.4rem] leading-tight">{isFirst ? "No recordings yet" : "Add a recording"}</h2>
      <p className="max-w-[62ch] text-ink2">
        {isFirst && "Film a job while you talk it through, then add the film here; it is marked out into steps afterwards. "}
        One film of one job on one vehicle, as the phone or camera saved it. It may be large: you can go on to other pages, and after a reload pick the
        same file again to go on where it stopped.
      </p>
      <div className="flex flex-wrap gap-3">
        <Button kind="main" onClick={() => picker.current?.click()}>
          Pick a film
        </Button>
        <Button className="pointer-fine:hidden" onClick={() => camera.current?.click()}>
          Film now
        </Button>
        <span className="self-center text-ink2 pointer-coarse:hidden">or drop it here</span>
      </div>
      <input ref={picker} type="file" accept="video/*,.mkv,.mts,.m2ts,.avi" multiple hidden onChange={picked} aria-label="Film to add" />
      <input ref={camera} type="file" accept="video/*" capture="environment" hidden onChange={picked} aria-label="Film taken now" />
    </div>
  );
}
