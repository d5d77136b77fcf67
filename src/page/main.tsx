import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { openExamples } from './examples.ts';
import './fonts.css';
import './page.css';
import { Page } from './Page.tsx';

const place = document.getElementById('page');
if (place === null) throw new Error('index.html has no element with the id "page".');

const root = createRoot(place);
const examples = await openExamples();
root.render(
  <StrictMode>
    <Page examples={examples} />
  </StrictMode>,
);
