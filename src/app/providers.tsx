import { type ReactNode, useEffect } from 'react';
import { applyMotion, applyTheme } from '#src/lib/theme.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';

/** What every screen stands on: theme, motion and projector size. */
export function Providers({ children }: { readonly children: ReactNode }) {
  const theme = usePreferences((state) => state.theme);
  const motion = usePreferences((state) => state.motion);
  const projector = usePreferences((state) => state.projector);
  useEffect(() => applyTheme(theme), [theme]);
  useEffect(() => applyMotion(motion), [motion]);
  useEffect(() => {
    document.documentElement.dataset.projector = String(projector);
  }, [projector]);
  return children;
}
