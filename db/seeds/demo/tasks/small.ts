import { asked, criticalRule, found, inspected, measured, plainRule, seen, set, torque } from "@/db/seeds/demo/tasks/criteria";
import type { TaskContent } from "@/lib/core/tasks/types";

const STAR = { critical: true };
const VALUES = "Demo values are invented.";

export const liftInduction: TaskContent = {
  title: "Two-post lift: induction",
  shortTitle: "Lift",
  area: "Workshop",
  conditions: `Shop vehicle, lift in date, 30 minutes. ${VALUES}`,
  criteria: [
    inspected("C1", "Before", "Finds the examination date and the rated load", "Both said, and compared with the car."),
    seen("C2", "Raise", "Sets the pads on the maker's points", "All four, checked from both sides.", STAR),
    seen("C3", "Raise", "Stops at 100 mm for the push test", "Front and back, nobody inside.", STAR),
    seen("C4", "Raise", "Lowers onto the locks", "Both heard and seen.", STAR),
    asked("C5", "After", "Says what stops a lift", "Date, damage, leak, a lock that doesn't engage."),
  ],
  rule: criticalRule({ practiceRuns: 3, evidencePhotos: 1 }),
};

export const roadWheel: TaskContent = {
  title: "Road wheel off and on",
  shortTitle: "Road wheel",
  area: "Wheels and tyres",
  conditions: `Shop vehicle, 30 minutes. ${VALUES}`,
  criteria: [
    seen("C1", "Off", "Cracks the bolts on the ground", "A quarter turn, before lifting."),
    inspected("C2", "On", "Seat and hub clean and dry", "Bare metal, no grease on threads."),
    seen("C3", "On", "Starts every bolt by hand", "At least three turns by hand."),
    measured("C4", "On", "Tightens on the ground, in star order", "115 N·m ±4 %.", torque(115), STAR),
    asked("C5", "After", "Says when it is checked again", "At 50 km, and who is told."),
  ],
  rule: criticalRule({ practiceRuns: 3 }),
};

export const drumBrakes: TaskContent = {
  title: "Inspect and adjust rear drum brakes",
  shortTitle: "Rear drums",
  area: "Brakes",
  conditions: `Shop vehicle, 90 minutes. ${VALUES}`,
  criteria: [
    seen("C1", "Open", "Dust controlled, no air line", "Mask and wet wipe throughout.", STAR),
    measured("C2", "Measure", "Drum diameter", "At most 204.0 mm, or the right conclusion said.", found("drum diameter, largest", "mm", { upper: 204, resolution: 0.1 }), STAR),
    measured("C3", "Measure", "Lining thickness", "At least 1.6 mm, or the right conclusion said.", found("lining thickness, thinnest", "mm", { lower: 1.6, resolution: 0.1 })),
    seen("C4", "Fit", "Springs and adjuster seated, handed right", "Left and right not mixed.", STAR),
    measured("C5", "Adjust", "Parking brake travel at the lever's end", "40 to 70 mm.", set("parking brake travel", "mm", { lower: 40, upper: 70, resolution: 1 })),
    inspected("C6", "Adjust", "Record complete; says who releases", "Every box filled.", { optional: true }),
  ],
  rule: criticalRule(),
};

export const tyrePressureSensor: TaskContent = {
  title: "Renew and teach in a tyre pressure sensor",
  shortTitle: "Pressure sensor",
  area: "Wheels and tyres",
  conditions: `Shop vehicle, 60 minutes. ${VALUES}`,
  criteria: [
    seen("C1", "Off", "Lets the tyre down fully before breaking the bead", "Valve core out, gauge at zero.", STAR),
    measured("C2", "Fit", "Tightens the sensor nut", "8 N·m ±4 %, new seal.", torque(8)),
    measured("C3", "Fit", "Sets the pressure, cold", "2.3 to 2.5 bar.", set("tyre pressure", "bar", { lower: 2.3, upper: 2.5, resolution: 0.05 })),
    seen("C4", "Prove", "Teaches the sensor in and proves it", "All four wheels show, in the right places."),
  ],
  rule: plainRule(),
};

export const headlampAim: TaskContent = {
  title: "Check and set headlamp aim",
  shortTitle: "Headlamp aim",
  area: "Electrical",
  conditions: `Shop vehicle, level bay, 30 minutes. ${VALUES}`,
  criteria: [
    seen("C1", "Before", "Tyres, load and lever right", "Pressures set, levelling at zero, someone in the seat."),
    seen("C2", "Before", "Sets up the tester square to the car", "Distance and height as marked on it."),
    measured("C3", "Set", "Dip of the beam, left", "−1.4 to −1.0 %.", set("dip, left lamp", "%", { lower: -1.4, upper: -1, resolution: 0.1 })),
    measured("C4", "Set", "Dip of the beam, right", "−1.4 to −1.0 %.", set("dip, right lamp", "%", { lower: -1.4, upper: -1, resolution: 0.1 })),
    inspected("C5", "After", "Record complete", "Before and after on the card.", { optional: true }),
  ],
  rule: plainRule(),
};

export const refrigerantRecovery: TaskContent = {
  title: "Recover refrigerant before opening the circuit",
  shortTitle: "Refrigerant",
  area: "Air conditioning",
  conditions: `Shop vehicle, recovery station, licensed person present. ${VALUES}`,
  criteria: [
    seen("C1", "Before", "Goggles and gloves, bay aired", "Before a coupling is touched.", STAR),
    inspected("C2", "Before", "Identifies the refrigerant", "Label read, analyser used."),
    measured("C3", "Recover", "Recovers down to the station's end pressure", "At most 0.5 bar absolute, held for five minutes.", set("end pressure", "bar", { upper: 0.5, resolution: 0.05 }), STAR),
    inspected("C4", "Recover", "Weighs what was recovered", "Amount read off, and within 10 g of the station's print."),
    inspected("C5", "After", "Log filled", "Date, amount, cylinder and licence number.", STAR),
  ],
  rule: plainRule({ licence: "refrigerant handling", evidencePhotos: 2, currencyMonths: 12 }),
};

export const serviceInspection: TaskContent = {
  title: "Service inspection, yearly",
  shortTitle: "Service",
  area: "Service",
  conditions: `Shop vehicle with three planted faults, 75 minutes. ${VALUES}`,
  criteria: [
    seen("C1", "Order", "Works round the car in one order", "Nothing visited twice, nothing left out."),
    inspected("C2", "Find", "Finds the planted faults", "All three, with the right words.", STAR),
    measured("C3", "Measure", "Tread depth, thinnest", "Within 0.2 mm of the assessor's, and what it means.", found("tread depth, thinnest", "mm", { lower: 1.6, resolution: 0.1 })),
    measured("C4", "Service", "Tightens the drain plug", "New washer, 30 N·m ±4 %.", torque(30)),
    asked("C5", "Tell", "Tells the customer's contact what was found", "Urgent, soon and watch kept apart; never says that the car is safe."),
    inspected("C6", "Tell", "Record complete", "Every box filled, every fault with a photo.", { optional: true }),
  ],
  rule: plainRule({ evidencePhotos: 3 }),
};
