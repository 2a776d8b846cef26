import { formatNumber } from './number.ts';
import { NO_BREAK_SPACE } from './units.ts';

/**
 * "14 min", "1 h 20 min", "2 h". Below 10 minutes half minutes are kept ("2.5 min"), because a hold
 * of 2 and one of 2.5 minutes are told apart; nothing shorter than half a minute is called a minute.
 */
export function formatDuration(minutes: number): string {
  if (!Number.isFinite(minutes)) return '–';
  if (minutes < 0) return `−${formatDuration(-minutes)}`;
  if (minutes > 0 && minutes < 0.75) return formatSeconds(minutes * 60);
  if (minutes < 10) return `${formatNumber(Math.round(minutes * 2) / 2, 1)}${NO_BREAK_SPACE}min`;
  const whole = Math.round(minutes);
  if (whole < 60) return `${formatNumber(whole)}${NO_BREAK_SPACE}min`;
  const hours = `${formatNumber(Math.floor(whole / 60))}${NO_BREAK_SPACE}h`;
  const rest = whole % 60;
  return rest === 0 ? hours : `${hours} ${formatNumber(rest)}${NO_BREAK_SPACE}min`;
}

/** "45 s": time in air, seconds to cover. */
export function formatSeconds(seconds: number): string {
  if (Math.abs(seconds) >= 120) return formatDuration(seconds / 60);
  return `${formatNumber(seconds)}${NO_BREAK_SPACE}s`;
}

/** A moment of the record, "0:31" or "1:20" as hours and minutes: what axes and tables show. */
export function formatClock(minute: number): string {
  if (!Number.isFinite(minute)) return '–';
  const whole = Math.round(Math.abs(minute));
  const text = `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
  return minute < 0 && whole > 0 ? `−${text}` : text;
}
