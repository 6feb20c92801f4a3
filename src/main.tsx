import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import './app/app.css';
import { App } from './app/app.tsx';
import { applyMotion, applyTheme } from './lib/theme.ts';
import { usePreferences } from './stores/preferences-store.ts';

const { theme, motion } = usePreferences.getState();
applyTheme(theme)();
applyMotion(motion)();

createRoot(document.getElementById('root') as HTMLElement).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
