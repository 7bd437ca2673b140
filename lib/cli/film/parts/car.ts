import { CHALK, circle, group, INK, path, RUBBER, STEEL, STEEL_DARK, STEEL_LIGHT } from "@/lib/cli/film/svg";

/** A small car of no make from its left side, 420 wide; its origin is where the front tyre touches the ground, front at the left. */
export function car(x: number, y: number, { scale = 1, frontWheel = true }: { scale?: number; frontWheel?: boolean } = {}): string {
  const wheel = (cx: number): string => circle(cx, -40, 40, RUBBER) + circle(cx, -40, 22, STEEL) + circle(cx, -40, 6, INK);
  return group(
    { x, y, scale },
    path(
      "M-78 -48 C-82 -80 -76 -98 -58 -104 L32 -118 C58 -150 92 -178 128 -182 L232 -182 C282 -180 306 -154 322 -118 C336 -108 342 -84 340 -48 L304 -44 A46 46 0 0 0 212 -44 L46 -44 A46 46 0 0 0 -46 -44 Z",
      STEEL_LIGHT,
    ),
    path("M50 -118 C70 -144 96 -164 128 -168 L168 -168 L168 -118 Z", STEEL_DARK),
    path("M182 -168 L232 -168 C266 -166 288 -148 302 -118 L182 -118 Z", STEEL_DARK),
    path("M-74 -90 l26 -8 l2 16 l-26 4 Z", CHALK, { "stroke-width": 2 }),
    path("M332 -104 l-12 0 l0 26 l16 0 Z", STEEL, { "stroke-width": 2 }),
    path("M175 -110 L175 -52", "none", { "stroke-width": 2 }),
    path("M196 -98 l26 0", "none", { "stroke-width": 4 }),
    frontWheel ? wheel(0) : circle(0, -40, 16, STEEL_DARK),
    wheel(258),
  );
}
