import { Camera, FileUp } from 'lucide-react';
import { useDropzone } from 'react-dropzone';
import { Button } from '../../../components/ui/button.tsx';
import { joinClasses } from '../../../lib/join-classes.ts';

/** Files by drop, by choosing, or by the camera of a phone. What they are is looked at by the server. */
export function DropZone({ onFiles }: { onFiles: (files: File[]) => void }) {
  const { getRootProps, getInputProps, isDragActive, open } = useDropzone({
    onDrop: onFiles,
    noClick: true,
    noKeyboard: true,
  });
  return (
    <div
      {...getRootProps()}
      className={joinClasses(
        'flex flex-col items-center gap-4 rounded-lg border-2 border-dashed px-5 py-8 text-center',
        isDragActive ? 'border-teal bg-teal-wash' : 'border-line-strong bg-paper-raised',
      )}
    >
      <input {...getInputProps({ 'aria-label': 'Files to scan in' })} />
      <p className="max-w-prose">
        <span className="font-semibold">
          {isDragActive ? 'Let go to send them.' : 'Drop scans here.'}
        </span>{' '}
        <span className="text-ink-soft">
          PDF or pictures, many at once; a whole pile may be one file.
        </span>
      </p>
      <div className="flex flex-wrap justify-center gap-3">
        <Button tone="primary" icon={<FileUp aria-hidden />} onClick={open}>
          Choose files
        </Button>
        <label className="inline-flex min-h-11 cursor-pointer items-center gap-2 rounded-md border border-line-strong bg-paper-raised px-4 font-semibold focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-teal hover:bg-paper-sunk">
          <Camera aria-hidden className="size-5" />
          Take a picture
          <input
            type="file"
            accept="image/*"
            capture="environment"
            className="sr-only"
            onChange={(event) => {
              onFiles([...(event.target.files ?? [])]);
              event.target.value = '';
            }}
          />
        </label>
      </div>
      <p className="text-sm text-ink-soft">
        Take staples out, lay the sheet flat, and keep wills, deeds, passports and photographs off
        the feeder.
      </p>
    </div>
  );
}
