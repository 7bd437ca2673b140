import { asked, criticalRule, found, inspected, measured, plainRule, seen, set, torque } from "@/db/seeds/demo/tasks/criteria";
import type { TaskContent } from "@/lib/core/tasks/types";

const STAR = { critical: true };
const volts = (quantity: string, lower: number, upper?: number) =>
  found(quantity, "V", { lower, ...(upper === undefined ? {} : { upper }), resolution: 0.01, instrument: "multimeter" });

export const auxiliaryBelt: TaskContent = {
  title: "Renew auxiliary belt and tensioner",
  shortTitle: "Auxiliary belt",
  area: "Engine",
  conditions: "Shop vehicle, engine cold, 75 minutes. Demo values are invented.",
  criteria: [
    seen("C1", "Before", "Key and fob locked away", "Before a hand goes in, and until the belt is checked.", STAR),
    inspected("C2", "Before", "Draws the belt's path", "Every pulley, ribs and back marked."),
    seen("C3", "Fit", "Checks the belt's path by a second turn by hand", "Two full turns, every pulley looked at.", STAR),
    measured("C4", "Pulleys", "Measures pulley alignment", "At most 1.0 mm, or the right conclusion said.", found("pulley alignment", "mm", { upper: 1, resolution: 0.1 })),
    asked("C5", "Pulleys", "Judges the idler", "Spun, rocked, and a reason given."),
    measured("C6", "Fit", "Tightens the tensioner bolt", "45 N·m ±4 %.", torque(45)),
    measured("C7", "Fit", "Belt frequency on the longest run", "122 to 134 Hz, pointer in its window.", set("belt frequency", "Hz", { lower: 122, upper: 134, resolution: 1 })),
    measured("C8", "Prove", "Charge reading at idle", "13.8 to 14.8 V, or the right conclusion said.", volts("charge voltage", 13.8, 14.8)),
    inspected("C9", "Prove", "Record complete", "Both readings, code and parts on the card.", { optional: true }),
  ],
  rule: plainRule({ practiceRuns: 2 }),
};

export const coolingPressureTest: TaskContent = {
  title: "Cooling pressure test and coolant change",
  shortTitle: "Cooling test",
  area: "Cooling",
  conditions: "Shop vehicle with a known leak, 120 minutes. Demo values are invented.",
  criteria: [
    measured("C1", "Before", "Proves the temperature and never opens it hot", "Below 40 °C, measured, before the cap moves.", found("coolant temperature at opening", "°C", { upper: 40, resolution: 1 }), STAR),
    measured("C2", "Test", "Tests the cap", "1.3 to 1.5 bar, or the right conclusion said.", found("cap opening pressure", "bar", { lower: 1.3, upper: 1.5, resolution: 0.05, instrument: "pressure tester" })),
    measured("C3", "Test", "Holds 1.2 bar for ten minutes", "Drop at most 0.05 bar after the repair.", set("pressure drop in ten minutes", "bar", { upper: 0.05, resolution: 0.01, instrument: "pressure tester" })),
    asked("C4", "Test", "Finds the leak", "Shown with a finger, and why it leaks."),
    seen("C5", "Drain", "Tray under, nothing spilt, tray covered", "No puddle left; the old coolant is named as poison."),
    measured("C6", "Fill", "Mixes the coolant", "Freezing point −38 to −34 °C.", set("freezing point", "°C", { lower: -38, upper: -34, resolution: 1 })),
    measured("C7", "Fill", "Fills the right amount", "5.9 to 6.5 L.", set("amount filled", "L", { lower: 5.9, upper: 6.5, resolution: 0.1 })),
    measured("C8", "Fill", "Bleeds the system and closes the bleed screw", "No bubbles, 5 N·m ±4 %.", torque(5)),
    seen("C9", "Prove", "Heater warm, level right when cold", "Both seen; fan kept clear of."),
    inspected("C10", "Prove", "Record complete", "Readings, leak, litres and waste on the card.", { optional: true }),
  ],
  rule: plainRule({ practiceRuns: 2, evidencePhotos: 2 }),
};

export const batteryDrain: TaskContent = {
  title: "12 V battery and parasitic draw",
  shortTitle: "Battery drain",
  area: "Electrical",
  conditions: "Shop vehicle with one circuit awake, 180 minutes with the wait. Demo values are invented.",
  criteria: [
    seen("C1", "Before", "Bridge keeps the circuit closed", "At no moment open; meter never in series while cranking.", STAR),
    measured("C2", "Battery", "Rest voltage", "Within 0.05 V of the assessor's; at least 12.50 V or the right conclusion.", volts("rest voltage", 12.5)),
    measured("C3", "Battery", "Cranking voltage", "At least 9.6 V or the right conclusion.", volts("cranking voltage", 9.6)),
    measured("C4", "Battery", "Charge voltage", "13.8 to 14.8 V or the right conclusion.", volts("charge voltage", 13.8, 14.8)),
    measured("C5", "Draw", "Waits 45 minutes with the latch closed, then reads the draw", "Within 5 mA of the assessor's; over 50 mA named as a fault.", found("parasitic draw", "mA", { upper: 50, resolution: 1, instrument: "multimeter" })),
    asked("C6", "Draw", "Names the circuit from volt drops over the fuses", "Fuse, current worked out, and how it was confirmed."),
    seen("C7", "Battery", "Negative lead off first, polarity right", "Off first, on last.", STAR),
    measured("C8", "Prove", "Draw after the repair", "Below 50 mA after the full wait.", set("parasitic draw after repair", "mA", { upper: 50, resolution: 1, instrument: "multimeter" })),
    inspected("C9", "Prove", "Codes cleared and recorded", "P0562 and U0140 on the card, memory kept or set again.", { optional: true }),
  ],
  rule: plainRule({ practiceRuns: 2, evidencePhotos: 2 }),
};

export const wheelBearing: TaskContent = {
  title: "Renew front wheel bearing, pressed",
  shortTitle: "Wheel bearing",
  area: "Chassis",
  conditions: "Shop vehicle, press with guard, 210 minutes. Demo values are invented.",
  criteria: [
    seen("C1", "Support", "Supports the car; hub nut cracked on the ground", "Push test and locks before going under.", STAR),
    seen("C2", "Press", "Presses on the outer ring only, guard closed", "Never through the balls; no fingers in the press.", STAR),
    inspected("C3", "Press", "Encoder face the right way", "Inward, before the ring goes in."),
    measured("C4", "Tighten", "New hub nut, first stage", "Nut new, 200 N·m ±4 %.", torque(200), STAR),
    measured("C5", "Tighten", "Hub nut, angle stage", "60° ±3°.", set("tightening angle", "°", { lower: 57, upper: 63, resolution: 1 }), STAR),
    measured("C6", "Prove", "Bearing play", "At most 0.05 mm.", set("bearing play", "mm", { upper: 0.05, resolution: 0.01, instrument: "dial gauge" })),
    measured("C7", "Prove", "Hub run-out", "At most 0.05 mm.", set("hub run-out", "mm", { upper: 0.05, resolution: 0.01, instrument: "dial gauge" })),
    measured("C8", "Tighten", "Pinch bolt", "75 N·m ±4 %.", torque(75)),
    measured("C9", "Prove", "Wheel speed signals of both sides, live", "At most 5 % apart.", set("difference of wheel speeds", "%", { upper: 5, resolution: 0.1 })),
    inspected("C10", "Prove", "Record complete", "Readings and parts on the card; says who releases.", { optional: true }),
  ],
  rule: criticalRule(),
};

export const clutchHydraulics: TaskContent = {
  title: "Bleed clutch hydraulics",
  shortTitle: "Clutch bleed",
  area: "Transmission",
  conditions: "Shop van, 60 minutes. Demo values are invented.",
  criteria: [
    seen("C1", "Before", "Goggles and gloves; paint covered", "Before the cap is opened."),
    asked("C2", "Before", "Says the fluid type from the cap; keeps the level", "Type said; never below MIN."),
    seen("C3", "Bleed", "No air left", "Two tests: clear hose, and a pedal that doesn't rise on pumping.", STAR),
    measured("C4", "Bleed", "Closes the nipple", "8 N·m ±4 %.", torque(8)),
    measured("C5", "Prove", "Pedal travel", "135 to 145 mm.", set("pedal travel", "mm", { lower: 135, upper: 145, resolution: 1 })),
    measured("C6", "Prove", "Biting point above the floor", "45 to 65 mm.", set("biting point", "mm", { lower: 45, upper: 65, resolution: 1 })),
    seen("C7", "Prove", "Roll test with the brake on", "Area clear, brake on, then engaged.", STAR),
    inspected("C8", "Prove", "Waste and record", "Bled fluid in its can, never used again; card complete.", { optional: true }),
  ],
  rule: plainRule(),
};
