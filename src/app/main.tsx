import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { BrowserRouter } from 'react-router-dom';
import { chosenTheme, showTheme } from '../ui/theme';
import { Providers } from './providers';
import { createQueryClient } from './query-client';
import { Router } from './router';
import './styles.css';

showTheme(chosenTheme());

const root = document.getElementById('root');
if (root === null) throw new Error('index.html has no element with the id root');

createRoot(root).render(
  <StrictMode>
    <BrowserRouter>
      <Providers client={createQueryClient()}>
        <Router />
      </Providers>
    </BrowserRouter>
  </StrictMode>,
);
