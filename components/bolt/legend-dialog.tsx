"use client";

import { useState } from "react";
import { BoltLegend } from "@/components/bolt/bolt-legend";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";

/** What the bolts mean, one tap away. */
export function LegendDialog() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button onClick={() => setOpen(true)}>Legend</Button>
      <Dialog open={open} onClose={() => setOpen(false)} title="What the bolts mean">
        <BoltLegend />
      </Dialog>
    </>
  );
}
