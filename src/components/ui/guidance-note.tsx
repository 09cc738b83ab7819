/** What every assessment, list and letter says. */
export function GuidanceNote({ className }: { className?: string }) {
  return (
    <p className={className ?? 'text-sm text-ink-soft'}>
      General guidance, not advice: local law decides. Ask the accountant or solicitor before
      destroying tax, legal or property papers.
    </p>
  );
}
