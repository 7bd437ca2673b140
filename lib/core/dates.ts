const DAY_NAMES = ["Sun", "Mon", "Tue", "Wed", "Thu", "Fri", "Sat"] as const;
const MONTH_NAMES = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"] as const;

type Parts = { year: number; month: number; day: number };

/** @param isoDay yyyy-mm-dd */
function partsOf(isoDay: string): Parts {
  const [year = Number.NaN, month = Number.NaN, day = Number.NaN] = isoDay.split("-").map(Number);
  return { year, month, day };
}

const toIso = ({ year, month, day }: Parts): string =>
  `${String(year).padStart(4, "0")}-${String(month).padStart(2, "0")}-${String(day).padStart(2, "0")}`;

const lastDayOf = (year: number, month: number): number => new Date(Date.UTC(year, month, 0)).getUTCDate();

/** A day as people read it: "Tue 1 Dec 2026". @param isoDay yyyy-mm-dd */
export function formatDay(isoDay: string): string {
  const { year, month, day } = partsOf(isoDay);
  const weekday = DAY_NAMES[new Date(Date.UTC(year, month - 1, day)).getUTCDay()] ?? "";
  return `${weekday} ${day} ${MONTH_NAMES[month - 1] ?? ""} ${year}`;
}

/** The same day of a later month, or that month's last day where it has no such day: 31 Jan + 1 → 28 Feb. */
export function addMonths(isoDay: string, months: number): string {
  const { year, month, day } = partsOf(isoDay);
  const index = year * 12 + (month - 1) + months;
  const to = { year: Math.floor(index / 12), month: (index % 12) + 1 };
  return toIso({ ...to, day: Math.min(day, lastDayOf(to.year, to.month)) });
}

/** Whole years on `isoDay` of somebody born on `bornOn`; a birthday of 29 Feb counts from 1 Mar in other years. */
export function ageOn(bornOn: string, isoDay: string): number {
  const years = partsOf(isoDay).year - partsOf(bornOn).year;
  return isoDay.slice(5) >= bornOn.slice(5) ? years : years - 1;
}

/** Whole days from one day to another; negative when the second is earlier. */
export function daysBetween(fromIsoDay: string, toIsoDay: string): number {
  const at = (isoDay: string) => {
    const { year, month, day } = partsOf(isoDay);
    return Date.UTC(year, month - 1, day);
  };
  return Math.round((at(toIsoDay) - at(fromIsoDay)) / 86_400_000);
}

/** The day that many days later; earlier for a negative number. */
export function addDays(isoDay: string, days: number): string {
  const { year, month, day } = partsOf(isoDay);
  return new Date(Date.UTC(year, month - 1, day + days)).toISOString().slice(0, 10);
}
