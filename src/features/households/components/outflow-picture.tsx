import { useId } from 'react';
import type { Outflow } from '../../../../server/contract/households.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';
import { useWidth } from '../../../lib/use-width.ts';
import { chooseYearStep, shapeOutflow } from '../logic/shape-outflow.ts';
import type { OutflowShape } from '../logic/shape-outflow.ts';
import { OutflowTable } from './outflow-table.tsx';

const height = 300;
const margin = { top: 34, bottom: 34, left: 12, right: 12 };
/** The strip at the left in which the paper stands that may leave today. */
const nowWidth = 72;

/** A falling line that eases from each level to the next, as water does. */
function drawSurface(points: readonly { x: number; y: number }[]): string {
  return points
    .map((point, i) => {
      const before = points[i - 1];
      if (!before) return `M${point.x} ${point.y}`;
      const middle = (before.x + point.x) / 2;
      return `C${middle} ${before.y} ${middle} ${point.y} ${point.x} ${point.y}`;
    })
    .join('');
}

function Drawing({ shape, width }: { shape: OutflowShape; width: number }) {
  const id = useId();
  const floor = height - margin.bottom;
  const scaleY = (sheets: number): number =>
    floor - (sheets / Math.max(1, shape.total)) * (floor - margin.top);
  const start = margin.left + nowWidth;
  const end = width - margin.right;
  const perYear = (end - start) / Math.max(1, shape.steps.length);
  const afterNow = shape.total - shape.dueNow;
  const surface = [
    { x: margin.left, y: scaleY(shape.total) },
    { x: start, y: scaleY(afterNow) },
    ...shape.steps.map((step, i) => ({ x: start + (i + 1) * perYear, y: scaleY(step.after) })),
  ];
  const line = drawSurface(surface);
  const settled = scaleY(shape.bed);
  const unsettledTop = scaleY(shape.bed + shape.unsettled);
  const yearStep = chooseYearStep(shape.steps.length, end - start);
  const bedRoom = floor - settled;
  const unsettledRoom = settled - unsettledTop;
  return (
    <svg
      aria-hidden
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      className="block"
    >
      <defs>
        <linearGradient id={`${id}-water`} x1="0" x2="0" y1="0" y2="1" className="text-teal">
          <stop offset="0" stopColor="currentColor" stopOpacity=".38" />
          <stop offset="1" stopColor="currentColor" stopOpacity=".14" />
        </linearGradient>
        <pattern id={`${id}-unsettled`} width="7" height="7" patternUnits="userSpaceOnUse">
          <path d="M0 7L7 0" className="stroke-ink-faint" strokeWidth="1" opacity=".55" />
        </pattern>
        <clipPath id={`${id}-below`}>
          <path d={`${line}L${end} ${floor}L${margin.left} ${floor}Z`} />
        </clipPath>
      </defs>
      <path d={`${line}L${end} ${floor}L${margin.left} ${floor}Z`} fill={`url(#${id}-water)`} />
      <g clipPath={`url(#${id}-below)`}>
        {shape.dueNow > 0 ? (
          <rect
            x={margin.left}
            y={scaleY(shape.total)}
            width={nowWidth}
            height={Math.max(0, scaleY(afterNow) - scaleY(shape.total))}
            className="fill-amber opacity-35"
          />
        ) : null}
        <rect
          x={margin.left}
          y={unsettledTop}
          width={end - margin.left}
          height={unsettledRoom}
          fill={`url(#${id}-unsettled)`}
        />
        <rect
          x={margin.left}
          y={settled}
          width={end - margin.left}
          height={bedRoom}
          className="fill-ink-soft"
        />
      </g>
      <path d={line} fill="none" strokeWidth="2.5" className="stroke-teal" />
      <line x1={margin.left} x2={end} y1={floor} y2={floor} className="stroke-line-strong" />
      <text x={margin.left} y={scaleY(shape.total) - 12} className="fill-ink text-sm font-semibold">
        {formatNumber(shape.total)} now
      </text>
      {shape.steps.map((step, i) => {
        const x = start + (i + 1) * perYear;
        const labelled = (step.year - (shape.steps[0]?.year ?? 0)) % yearStep === 0;
        return (
          <g key={step.year}>
            <line x1={x} x2={x} y1={floor} y2={floor + 5} className="stroke-line-strong" />
            {labelled ? (
              <text
                x={x - perYear / 2}
                y={floor + 22}
                textAnchor="middle"
                className="fill-ink-soft text-[13px]"
              >
                {step.year}
              </text>
            ) : null}
            {step.leaving > 0 && perYear >= 44 ? (
              <text
                x={x - perYear / 2}
                y={(scaleY(step.before) + scaleY(step.after)) / 2 - 14}
                textAnchor="middle"
                className="fill-teal-strong text-[13px] font-semibold"
              >
                −{formatNumber(step.leaving)}
              </text>
            ) : null}
          </g>
        );
      })}
      <text
        x={margin.left + nowWidth / 2}
        y={floor + 22}
        textAnchor="middle"
        className="fill-ink-soft text-[13px]"
      >
        now
      </text>
      {bedRoom >= 20 ? (
        <text
          x={end - 10}
          y={settled + bedRoom / 2 + 5}
          textAnchor="end"
          className="fill-white text-sm font-semibold"
        >
          {formatNumber(shape.bed)} for good
        </text>
      ) : null}
    </svg>
  );
}

function Key({ className, children }: { className: string; children: string }) {
  return (
    <li className="flex items-center gap-2">
      <span aria-hidden className={`size-3.5 shrink-0 rounded-sm ${className}`} />
      {children}
    </li>
  );
}

/** How much paper is still to leave, year by year, and what stays: a tide that goes out. */
export function OutflowPicture({ outflow }: { outflow: Outflow }) {
  const [frame, width] = useWidth<HTMLDivElement>(640);
  const shape = shapeOutflow(outflow);
  const captionId = useId();
  return (
    <figure aria-labelledby={captionId}>
      <figcaption id={captionId} className="max-w-prose">
        {shape.sentence}
        {outflow.left > 0 ? ` ${formatCount(outflow.left, 'sheet')} have left already.` : ''}
      </figcaption>
      <div ref={frame} className="mt-4 overflow-hidden">
        {shape.total > 0 ? (
          <Drawing shape={shape} width={width} />
        ) : (
          <div className="flex h-40 items-end border-b-2 border-line-strong" />
        )}
      </div>
      {shape.total > 0 ? (
        <ul className="mt-2 flex flex-wrap gap-x-5 gap-y-1 text-sm text-ink-soft">
          {shape.dueNow > 0 ? <Key className="bg-amber/50">may leave now</Key> : null}
          {shape.steps.some((step) => step.leaving > 0) ? (
            <Key className="bg-teal/35">leaves in its year</Key>
          ) : null}
          {shape.unsettled > 0 ? (
            <Key className="text-ink-faint bg-[repeating-linear-gradient(135deg,currentColor_0_1px,transparent_1px_4px)]">
              not settled yet
            </Key>
          ) : null}
          {shape.bed > 0 ? <Key className="bg-ink-soft">stays for good</Key> : null}
        </ul>
      ) : null}
      {shape.total > 0 ? <OutflowTable outflow={outflow} /> : null}
    </figure>
  );
}
