import type { ReactNode } from 'react';
import { joinClasses } from '../../lib/join-classes.ts';

interface PageFrameProps {
  /** `reading` for forms and text, `wide` for tables, `normal` for the rest. */
  width?: 'reading' | 'normal' | 'wide';
  children: ReactNode;
}

const widths = { reading: 'max-w-3xl', normal: 'max-w-6xl', wide: 'max-w-[100rem]' };

/** The room a screen has, with its margins. */
export function PageFrame({ width = 'normal', children }: PageFrameProps) {
  return (
    <div className={joinClasses('mx-auto w-full px-4 py-6 sm:px-6 sm:py-8 lg:px-8', widths[width])}>
      {children}
    </div>
  );
}
