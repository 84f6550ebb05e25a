const pad = (value: number): string => String(value).padStart(2, '0');

/** A time as ISO date, hour and minute with its zone, in the reader's own zone: `2026-11-24 16:02 +01:00`. */
export function timeText(iso: string): string {
  const time = new Date(iso);
  const offset = -time.getTimezoneOffset();
  const zone = `${offset < 0 ? '−' : '+'}${pad(Math.floor(Math.abs(offset) / 60))}:${pad(Math.abs(offset) % 60)}`;
  return `${dayText(iso)} ${pad(time.getHours())}:${pad(time.getMinutes())} ${zone}`;
}

/** The day of a time in the reader's own zone, ISO. */
export function dayText(iso: string): string {
  const time = new Date(iso);
  return `${time.getFullYear()}-${pad(time.getMonth() + 1)}-${pad(time.getDate())}`;
}

/** How long ago, in the words of a list: "today", "1 day", "12 days". */
export function ageText(iso: string, now: Date = new Date()): string {
  const days = Math.floor((now.getTime() - new Date(iso).getTime()) / 86_400_000);
  if (days < 1) return 'today';
  return days === 1 ? '1 day' : `${days} days`;
}
