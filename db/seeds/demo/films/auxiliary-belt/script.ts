import { CAUTIONS } from "@/db/seeds/demo/films/auxiliary-belt/facts";
import { note, value } from "@/db/seeds/demo/films/plates";
import type { FilmScript } from "@/db/seeds/demo/films/types";

/** Five steps, told by an invented mentor. Condensed, and the summary says so. */
export const script: FilmScript = {
  key: "auxiliary-belt",
  title: "Auxiliary belt and tensioner, Tessaly Brisk",
  vehicle: "Tessaly Brisk 1.0",
  mentor: "Bertram Okolund",
  voice: { name: "en-gb+m3", wordsPerMinute: 134 },
  summary:
    "Renewing the auxiliary belt and its tensioner, from the squeal to the charge reading. Drawn and spoken for the demo: step times are condensed, and every value is invented. Never use one on a real vehicle; the maker's data rules.",
  steps: [
    {
      key: "B1",
      title: "Noise and code",
      scenes: [
        {
          picture: "belt-concern",
          lines: [
            { text: "Auxiliary belt and tensioner on the Tessaly Brisk. Car and values are invented, so never carry a number from here to a real car.", plates: [note("Every value is invented")] },
            { key: "code", text: "It squeals from cold, the battery lamp flickers, and one code is stored: P0562, system voltage low.", plates: [note("P0562: system voltage low")] },
          ],
        },
        {
          picture: "charge-low",
          lines: [
            { key: "charge", text: "At idle I read 13.1 V. Charging should give 13.8 to 14.8. Something slips, or something is worn out. Don't guess. Look.", plates: [value("Charge", "13.8–14.8", "V")], holdMs: 500 },
          ],
        },
        {
          picture: "belt-faults",
          lines: [
            { text: "Turn the belt under the lamp, all the way round.", plates: [note("All the way round")] },
            { key: "faults", text: "Three cracks in 25 mm and it is renewed. Oil on the ribs, or a glazed, shiny face, and it is renewed as well.", plates: [value("Renew at", "3", "cracks", "in any 25 mm"), note("Oil or glaze: renew")], holdMs: 800 },
          ],
        },
      ],
    },
    {
      key: "B2",
      title: "Off, key away, routing drawn",
      scenes: [
        { picture: "caution", caution: CAUTIONS.starts, lines: [{ text: "A fan or an engine that starts by itself takes fingers with it. Engine off, key out and locked away, before a hand goes in." }] },
        {
          picture: "key-box",
          lines: [
            { key: "key", text: "Key in the box, box locked, and the key to the box in your own pocket. A car that starts by a button needs its fob locked away too.", plates: [note("Key and fob locked away")], holdMs: 300 },
          ],
        },
        {
          picture: "routing",
          lines: [
            { key: "draw", text: "Before you touch the belt, draw its path. Crank, tensioner, alternator, idler, water pump, compressor, and back to the crank.", plates: [note("Draw the path")], holdMs: 500 },
            { text: "Mark which side of the belt runs on which pulley: ribs on grooves, back on the smooth ones.", plates: [note("Ribs on grooves")] },
          ],
        },
      ],
    },
    {
      key: "B3",
      title: "Tensioner relieved, pinned",
      scenes: [
        { picture: "caution", caution: CAUTIONS.sprung, lines: [{ text: "The tensioner is sprung, and a bar that slips breaks a hand. Both hands, slowly, and pin it before you let go." }] },
        {
          picture: "relieve",
          lines: [
            { key: "relieve", text: "Bar on the tensioner, and turn it against its spring. Feel the belt go slack.", plates: [note("Against the spring")], holdMs: 400 },
            { key: "pin", text: "Hold it there, push the pin through both holes, and let it settle onto the pin.", plates: [note("Pin through both holes")], holdMs: 400 },
          ],
        },
        {
          picture: "belt-off",
          lines: [
            { key: "off", text: "Now the belt comes off, from the smooth idler first. Keep the old one beside you, and compare length and ribs with the new.", plates: [note("Same length, same ribs")], holdMs: 500 },
          ],
        },
      ],
    },
    {
      key: "B4",
      title: "Pulleys, alignment, idler feel",
      scenes: [
        {
          picture: "idler",
          lines: [
            { key: "idler", text: "Spin the idler and listen. Then rock it. It should run quietly, and have no play. A rough one goes, belt or no belt.", plates: [note("Quiet, no play")], holdMs: 300 },
          ],
        },
        {
          picture: "alignment",
          lines: [
            { key: "align", text: "Straight edge across the pulley faces. The demo allows 1.0 mm out of line. I can get 0.4 under it: that is inside.", plates: [value("Alignment, limit", "1.0", "mm"), value("Here", "0.4", "mm")], holdMs: 500 },
          ],
        },
        {
          picture: "tensioner-torque",
          lines: [
            { key: "bolt", text: "New tensioner on, its peg in its hole. Bolt to 45 N·m. The idler bolt gets 40.", plates: [value("Tensioner bolt", "45", "N·m", "accept 43.2–46.8"), value("Idler bolt", "40", "N·m", "accept 38.4–41.6")], holdMs: 800 },
          ],
        },
      ],
    },
    {
      key: "B5",
      title: "Fit, tension, run, recap",
      scenes: [
        {
          picture: "belt-on",
          lines: [
            { text: "New belt on, by your drawing, the smooth idler last. Take the bar, pull the pin, and let the tensioner come up slowly.", plates: [note("By your drawing"), note("Let it up slowly")] },
          ],
        },
        {
          picture: "one-rib-off",
          lines: [
            { key: "rib", text: "Look at every pulley. If the belt sits one rib off, take it off and seat it again. Never start it to see whether it finds its place.", plates: [note("One rib off: re-seat")], holdMs: 500 },
          ],
        },
        {
          picture: "second-turn",
          lines: [
            { key: "turn", text: "Turn the crank by hand, two full turns, and look again at every pulley.", plates: [value("By hand", "2", "turns")], holdMs: 400 },
          ],
        },
        {
          picture: "frequency",
          lines: [
            { key: "hertz", text: "Pointer inside its window. Then pluck the longest run, and read the frequency: 128 Hz, give or take 6.", plates: [value("Belt", "128 ±6", "Hz")], holdMs: 700 },
          ],
        },
        { picture: "caution", caution: CAUTIONS.running, lines: [{ text: "A running belt pulls in sleeves, hair and rags, and the hand goes with them. Guards on, and stand back." }] },
        {
          picture: "charge-good",
          lines: [
            { key: "after", text: "Key back, start it, and read the charge: 14.2 V. Quiet, and inside. Clear the code, and write both readings on the card.", plates: [value("Charge now", "14.2", "V", "13.8–14.8")], holdMs: 400 },
          ],
        },
        {
          picture: "recap-belt",
          lines: [{ text: "So: key away, path drawn, pinned before you let go. Two turns by hand, and a number for tension and charge.", holdMs: 1600 }],
        },
      ],
    },
  ],
};
