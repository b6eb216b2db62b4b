import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { startI18n } from '../lib/i18n';
import '../theme/sheet.css';
import './layout/layout.css';
import './layout/tables.css';
import { Providers } from './providers';
import { App } from './router';

const root = document.getElementById('root');
if (root === null) throw new Error('index.html has no #root');

void startI18n().then(() =>
  createRoot(root).render(
    <StrictMode>
      <Providers>
        <App />
      </Providers>
    </StrictMode>,
  ),
);
