import './index.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { App } from './app/app.tsx';
import { ApiProblem } from './lib/api-problem.ts';

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no #root');
createRoot(root, {
  // What the server refused is said on the page; only errors of ours belong in the console.
  onCaughtError: (error) => {
    if (!(error instanceof ApiProblem)) reportError(error);
  },
}).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
