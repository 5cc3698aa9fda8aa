import type { DrawnFet, SheetSettings } from './drawing';

/** Whether a FET conducts at VGS = 0: its threshold has the sign that its kind has when depleted. */
export function isDepletion({ kind, values }: DrawnFet, { processes }: SheetSettings): boolean {
  const threshold = values.overrides?.threshold ?? processes[values.process ?? '']?.[kind]?.threshold ?? 0;
  return kind === 'nfet' ? threshold < 0 : threshold > 0;
}
