import { create } from 'zustand';
import { persist } from 'zustand/middleware';
import type { QuantityId } from '#shared/units/quantities.ts';

/** What one person chose on this device. */
export interface Preferences {
  readonly system: 'si' | 'us';
  /** Unit id per quantity where it differs from the system. */
  readonly overrides: Readonly<Partial<Record<QuantityId, string>>>;
  readonly theme: 'auto' | 'light' | 'dark';
  readonly motion: 'auto' | 'reduced';
  readonly projector: boolean;
  /** Decimal sign: that of the browser's locale until the person chooses. */
  readonly decimal: '.' | ',';
}
export interface PreferencesState extends Preferences {
  set: (patch: Partial<Preferences>) => void;
}

function localeDecimal(): '.' | ',' {
  return new Intl.NumberFormat().format(1.5).includes(',') ? ',' : '.';
}

export const usePreferences = create<PreferencesState>()(
  persist(
    (set) => ({
      system: 'si' as const,
      overrides: {},
      theme: 'auto' as const,
      motion: 'auto' as const,
      projector: false,
      decimal: localeDecimal(),
      set: (patch) => set(patch),
    }),
    { name: 'swashbench-preferences', version: 1 },
  ),
);
