import { CAUTIONS } from "@/db/seeds/demo/films/front-brake-discs/facts";
import { note, value } from "@/db/seeds/demo/films/plates";
import type { FilmScript } from "@/db/seeds/demo/films/types";

/** Seven steps, told by an invented mentor. The full job takes an afternoon; its steps are condensed here, and the summary says so. */
export const script: FilmScript = {
  key: "front-brake-discs",
  title: "Front brake pads and discs, Corvane Lume",
  vehicle: "Corvane Lume 1.2",
  mentor: "Sunniva Pryce",
  voice: { name: "en-gb+f3", wordsPerMinute: 152 },
  summary:
    "Renewing front pads and discs on one axle, from the concern on the card to the hard pedal. Drawn and spoken for the demo: step times are condensed, and every value is invented. Never use one on a real vehicle; the maker's data rules.",
  steps: [
    {
      key: "A1",
      title: "Concern, data, stop rules",
      scenes: [
        {
          picture: "job-card",
          lines: [
            { text: "Front pads and discs on the Corvane Lume. Car, values and workshop are invented, so never use a number from here on a real car.", plates: [note("Every value is invented")] },
            { text: "The card says: the steering wheel shakes when braking from motorway speed. Read it back, word for word.", plates: [note("Read the card back")] },
          ],
        },
        {
          picture: "limit",
          lines: [
            { text: "Open the maker's data for this very vehicle. A new disc is 24.0 mm thick.", plates: [value("Disc, new", "24.0", "mm")] },
            { key: "limit", text: "The number that decides is the limit: 22.0 mm.", plates: [value("Disc, limit", "22.0", "mm", "decides scrapping")], holdMs: 700 },
          ],
        },
        {
          picture: "tools",
          lines: [{ text: "Lay out the micrometer, the dial gauge, both torque wrenches, a hook and the piston tool.", plates: [note("TW-1: 5–50 N·m"), note("TW-2: 20–200 N·m")] }],
        },
        {
          picture: "stop-rules",
          lines: [{ key: "stop", text: "Three things stop this job: no data, a lift past its examination date, or a weeping hose." }],
        },
      ],
    },
    {
      key: "A2",
      title: "Raise, support, wheel off",
      scenes: [
        {
          picture: "caution",
          caution: CAUTIONS.raised,
          lines: [{ text: "A car that slips off its pads kills. Push test at 100 mm, locks engaged, nobody inside or underneath." }],
        },
        {
          picture: "crack-bolts",
          lines: [{ key: "crack", text: "With the tyres still on the ground, crack each wheel bolt a quarter turn.", plates: [note("¼ turn, on the ground")] }],
        },
        {
          picture: "lift",
          lines: [
            { text: "Set the four pads on the maker's jacking points.", plates: [note("Four pads, four points")] },
            { key: "push", text: "Raise 100 mm, stop, and push the car hard. It must not rock.", plates: [value("Push test at", "100", "mm")], holdMs: 600 },
            { key: "locks", text: "Only then go to working height, and lower onto the locks. Listen for both.", plates: [note("Both locks engaged")], holdMs: 800 },
          ],
        },
        { picture: "wheel-off", lines: [{ text: "Wheel off. Store it face up, out of the way." }] },
      ],
    },
    {
      key: "A3",
      title: "Measure before you strip",
      scenes: [
        { picture: "caution", caution: CAUTIONS.dust, lines: [{ text: "Brake dust harms your lungs. Mask on, wipe wet, and never the air line." }] },
        {
          picture: "pads",
          lines: [
            { key: "pads", text: "Left front pads: inner 2.2 mm, outer 5.1. The limit is 3.0. And a pair that differs by more than 2.0 mm has a cause: find it.", plates: [value("Pad limit", "3.0", "mm"), value("Pair differs by", "2.9", "mm", "over 2.0: find the cause")] },
          ],
        },
        {
          picture: "measure-disc",
          lines: [
            { text: "Put all the wheel bolts back with spacers, so the disc sits flat. Zero the micrometer.", plates: [note("All bolts, with spacers"), note("Zero first")] },
            { key: "eight", text: "Measure 10 mm in from the edge, at eight points, 45 degrees apart. Write all eight down.", plates: [note("8 points, 45° apart")] },
            { key: "variation", text: "Thickness variation is the highest minus the lowest, of all eight.", holdMs: 2200 },
          ],
        },
        {
          picture: "left-verdict",
          lines: [
            { key: "lowest", text: "Lowest on the left: 21.87, against a limit of 22.0.", plates: [value("Left, lowest", "21.87", "mm", "limit 22.0")], holdMs: 700 },
            { key: "varies", text: "Its variation is 0.05 mm, where 0.015 is allowed. That is the shake in the wheel.", plates: [value("Variation limit", "0.015", "mm")] },
          ],
        },
        {
          picture: "both-discs",
          lines: [
            { key: "right", text: "Right disc: lowest 22.30, above the limit. But it varies by 0.02, and its partner is scrap.", plates: [value("Right, lowest", "22.30", "mm", "variation 0.02")], holdMs: 600 },
            { text: "So both go. The left is under its limit, the right varies too much, and discs are changed by axle.", plates: [note("Always by axle")] },
          ],
        },
      ],
    },
    {
      key: "A4",
      title: "Strip",
      scenes: [
        {
          picture: "caution",
          caution: CAUTIONS.eyes,
          lines: [{ text: "Brake fluid and springs can blind an eye. Goggles on first." }],
        },
        {
          picture: "caution",
          caution: CAUTIONS.hose,
          lines: [{ text: "A calliper hanging by its hose tears it inside. Hook it up, hose slack." }],
        },
        {
          picture: "piston",
          lines: [
            { key: "cap", text: "Loosen the reservoir cap, then push the piston back slowly. The fluid has to go somewhere: watch the MAX line.", plates: [note("Cap loose first"), note("Watch MAX")], holdMs: 500 },
          ],
        },
        {
          picture: "hook",
          lines: [{ key: "hook", text: "Slide-pin bolts out, calliper onto its hook.", plates: [note("Hose slack")] }],
        },
        {
          picture: "slide-pin",
          lines: [
            { key: "pin", text: "And here is the cause. The lower pin is stiff. Clean it, check the boot, silicone grease, and a new pin if it is pitted.", plates: [note("Must move by hand")], holdMs: 400 },
          ],
        },
        {
          picture: "strip-order",
          lines: [{ key: "order", text: "Now the pads, then the carrier bolts, the disc screw, and last the disc, by hand.", holdMs: 700 }],
        },
      ],
    },
    {
      key: "A5",
      title: "Hub face and new disc",
      scenes: [
        {
          picture: "hub",
          lines: [{ key: "hub", text: "Clean the hub face to bare metal. Its run-out here is 0.01; the limit is 0.02 mm.", plates: [value("Hub face", "0.01", "mm", "limit 0.02")] }],
        },
        {
          picture: "run-out",
          lines: [
            { key: "fitted", text: "Degrease the new disc and fit it with all its bolts. Fitted run-out may be 0.05 at most.", plates: [value("Fitted, limit", "0.05", "mm")], holdMs: 400 },
            { key: "high", text: "I read 0.07. Too much, on a good hub.", plates: [value("First reading", "0.07", "mm")], holdMs: 500 },
            { key: "index", text: "So turn the disc two holes on the hub, and measure again: 0.03. That is inside.", plates: [value("Turned two holes", "0.03", "mm")], holdMs: 400 },
          ],
        },
        {
          picture: "disc-screw",
          lines: [{ key: "screw", text: "Disc screw: 10 N·m, with wrench one. Below its range, a wrench proves nothing.", plates: [value("Disc screw", "10", "N·m"), note("TW-1")], holdMs: 500 }],
        },
      ],
    },
    {
      key: "A6",
      title: "Pads, pins, torque",
      scenes: [
        { picture: "caution", caution: CAUTIONS.grease, lines: [{ text: "Grease on a disc or a pad takes the brake away. Grease the pins only." }] },
        {
          picture: "new-pads",
          lines: [{ text: "New pads, 12.0 mm. Wear sensor on the inner side, chamfer leading, boots seated.", plates: [value("Pad, new", "12.0", "mm")] }],
        },
        {
          picture: "carrier-torque",
          lines: [
            { key: "carrier", text: "Carrier bolts are used once. New bolts, 105 N·m, with wrench two.", plates: [value("Carrier bolts, new", "105", "N·m", "accept 100.8–109.2")], holdMs: 900 },
            { text: "Then draw your line across the head, so that anyone can see it has not moved.", plates: [note("Paint line across")], holdMs: 500 },
          ],
        },
        {
          picture: "pin-torque",
          lines: [{ key: "pins", text: "Slide-pin bolts: 28 N·m, with wrench one.", plates: [value("Slide-pin bolts", "28", "N·m", "accept 26.9–29.1")], holdMs: 700 }],
        },
      ],
    },
    {
      key: "A7",
      title: "Pedal, wheel, proof, recap",
      scenes: [
        { picture: "caution", caution: CAUTIONS.pedal, lines: [{ key: "pump", text: "Danger. The first press goes to the floor and the car will not stop. Pump until the pedal is hard, then move." }] },
        {
          picture: "pedal",
          lines: [{ text: "Pump, hold it hard, then bring the fluid to MAX. Fresh fluid only.", plates: [note("Hard, and holds"), note("Fluid at MAX")] }],
        },
        {
          picture: "wheel-star",
          lines: [{ key: "star", text: "Wheel seat clean and dry, bolts in by hand, lower the car, then 115 N·m, in star order, on the ground.", plates: [value("Wheel bolts", "115", "N·m", "accept 110.4–119.6")], holdMs: 1000 }],
        },
        {
          picture: "rollers",
          lines: [
            { key: "rollers", text: "On the rollers: 2.40 and 2.16 kN. Imbalance is high minus low, over high. Our house limit is 15 %.", plates: [value("House limit", "15", "%")], holdMs: 900 },
          ],
        },
        {
          picture: "road",
          lines: [{ key: "road", text: "Ten per cent. Then a licensed driver makes ten gentle stops, 50 down to 15 km/h, and lets it cool between.", plates: [note("Imbalance 10 %"), note("Licensed driver only")], holdMs: 400 }],
        },
        {
          picture: "release",
          lines: [{ key: "release", text: "You do not release this car. The qualified person named on the card does. Wheel bolts are checked again at 50 km.", plates: [note("Re-check at 50 km")], holdMs: 500 }],
        },
        {
          picture: "recap-discs",
          lines: [{ text: "So: the limit decides, not the new size. Both discs, by axle. New carrier bolts. And a hard pedal before it moves.", holdMs: 1600 }],
        },
      ],
    },
  ],
};
