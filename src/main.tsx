import './http/no-eval.ts';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './App.tsx';
import './styles.css';
import { applyThemeChoice, storedThemeChoice } from './ui/theme.ts';

applyThemeChoice(storedThemeChoice());

const root = document.getElementById('root');
if (!root) throw new Error('The page has no #root to mount on.');
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
