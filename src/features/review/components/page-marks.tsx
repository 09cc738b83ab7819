import { joinClasses } from '../../../lib/join-classes.ts';
import { padBox, type Mark } from '../logic/marks.ts';

interface PageMarksProps {
  marks: Mark[];
  activeKey: string | null;
  onActive: (key: string | null) => void;
}

/**
 * Quiet outlines where facts were read. They repeat what the list beside the page says, so they are for
 * the eye alone.
 */
export function PageMarks({ marks, activeKey, onActive }: PageMarksProps) {
  return (
    <div aria-hidden="true" className="pointer-events-none absolute inset-0">
      {marks.map((mark) => {
        const box = padBox(mark.box);
        const isActive = mark.key === activeKey;
        return (
          <div
            key={mark.key}
            data-mark={mark.key}
            onPointerEnter={() => onActive(mark.key)}
            onPointerLeave={() => onActive(null)}
            className={joinClasses(
              'pointer-events-auto absolute rounded-sm border-2 transition-colors motion-reduce:transition-none',
              isActive ? 'border-teal bg-teal/15' : 'border-teal/45',
            )}
            style={{
              left: `${box.x * 100}%`,
              top: `${box.y * 100}%`,
              width: `${box.w * 100}%`,
              height: `${box.h * 100}%`,
            }}
          >
            {isActive && (
              <span
                className={joinClasses(
                  'absolute left-0 rounded bg-teal px-1.5 py-0.5 text-xs whitespace-nowrap text-white',
                  box.y < 0.05 ? 'top-full mt-1' : 'bottom-full mb-1',
                )}
              >
                {mark.label}
              </span>
            )}
          </div>
        );
      })}
    </div>
  );
}
