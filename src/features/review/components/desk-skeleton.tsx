import { Skeleton } from '../../../components/ui/states.tsx';

/** The shape of the desk while the paper is on its way. */
export function DeskSkeleton({ isWide }: { isWide: boolean }) {
  return (
    <div
      role="status"
      className={
        isWide ? 'flex h-[calc(100dvh-var(--app-top,0px))] gap-4 p-4' : 'flex flex-col gap-4 p-4'
      }
    >
      <span className="sr-only">Fetching the paper</span>
      <Skeleton className={isWide ? 'h-full flex-1' : 'h-[58dvh]'} />
      <div className={isWide ? 'w-[27rem] space-y-4' : 'space-y-4'}>
        <Skeleton className="h-10 w-2/3" />
        <Skeleton className="h-24" />
        <Skeleton className="h-40" />
      </div>
    </div>
  );
}
