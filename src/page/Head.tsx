import type { ReactElement, ReactNode } from 'react';
import { Choice } from '../controls/Choice.tsx';
import { chooseTheme, themeChoices, useThemeChoice } from './theme.ts';

/** The bar along the top: the stage's title, what belongs to the stage, and the choice of theme. */
export function Head({
  title,
  children,
}: {
  readonly title: string;
  readonly children?: ReactNode;
}): ReactElement {
  return (
    <header className="head">
      <h1>{title}</h1>
      {children}
      <div className="far">
        <Choice name="theme" options={themeChoices} chosen={useThemeChoice()} onChoose={chooseTheme} />
      </div>
    </header>
  );
}
