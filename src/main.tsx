import { setNonce } from 'get-nonce';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { z } from 'zod';
import { App } from './app/app';
import { styleNonce } from './lib/style-nonce';
import './app/app.css';

// zod would try to compile with `new Function`, which our content security policy forbids.
z.config({ jitless: true });

// The widgets that lock scrolling add a style element; the policy lets it through with this answer's nonce.
const nonce = styleNonce();
if (nonce) setNonce(nonce);

const root = document.getElementById('root');
if (!root) throw new Error('the page has no root');
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
);
