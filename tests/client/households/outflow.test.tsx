import { render, screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Outflow } from '../../../server/contract/households.ts';
import { OutflowPicture } from '../../../src/features/households/components/outflow-picture.tsx';
import {
  chooseYearStep,
  shapeOutflow,
} from '../../../src/features/households/logic/shape-outflow.ts';

const outflow: Outflow = {
  today: '2026-12-01',
  left: 40,
  dueNow: 30,
  years: [
    { year: 2027, sheets: 20, papers: 4 },
    { year: 2032, sheets: 10, papers: 2 },
  ],
  permanent: 25,
  open: 15,
  toReview: 5,
};

describe('the outflow', () => {
  it('falls year by year to what stays for good and what is not settled', () => {
    const shape = shapeOutflow(outflow);
    expect(shape.total).toBe(105);
    expect(shape.steps[0]).toEqual({ year: 2026, leaving: 0, before: 75, after: 75 });
    expect(shape.steps[1]).toEqual({ year: 2027, leaving: 20, before: 75, after: 55 });
    expect(shape.steps.at(-1)).toEqual({ year: 2032, leaving: 10, before: 55, after: 45 });
    expect(shape.steps.at(-1)?.after).toBe(outflow.permanent + outflow.open + outflow.toReview);
  });

  it('can be read and heard without the picture', () => {
    render(<OutflowPicture outflow={outflow} />);
    expect(
      screen.getByRole('figure', {
        name: /105 sheets in the house: 30 sheets may leave now, 30 sheets may leave year by year until 2032, 25 sheets stay for good, for 15 sheets it is not settled yet and 5 sheets wait to be looked at\. 40 sheets have left already\./,
      }),
    ).toBeInTheDocument();
    const table = screen.getByRole('table', { hidden: true });
    const row = within(table).getByRole('row', { name: /2027/, hidden: true });
    expect(row).toHaveTextContent('2027204');
  });

  it('says so when there is no paper yet', () => {
    render(
      <OutflowPicture
        outflow={{ ...outflow, left: 0, dueNow: 0, years: [], permanent: 0, open: 0, toReview: 0 }}
      />,
    );
    expect(screen.getByText('No paper is on record in this household yet.')).toBeInTheDocument();
    expect(screen.queryByRole('table', { hidden: true })).not.toBeInTheDocument();
  });

  it('labels as many years as there is room for', () => {
    expect(chooseYearStep(5, 600)).toBe(1);
    expect(chooseYearStep(30, 300)).toBe(10);
  });
});
