import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';

const place = document.getElementById('root');
if (place === null) throw new Error('main: the page has no element "root"');

createRoot(place).render(
  <StrictMode>
    <h1>Gapwright</h1>
  </StrictMode>,
);
