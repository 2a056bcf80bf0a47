import { FileTrigger } from 'react-aria-components/FileTrigger';
import { Button } from '../Button';
import { useHydrated } from '../use-hydrated';
import { TAKEN } from './file-refusal';

interface Props {
  onFile: (file: File) => void;
}

/** An empty plate: the page takes a drop anywhere; here it says so. */
export function DropPlace({ onFile }: Props) {
  return (
    <div className="flex flex-col items-start gap-4 border border-dashed border-edge bg-sheet px-6 py-10 md:px-10 md:py-16">
      <p className="text-25 font-semibold">Drop your drawing or photograph here</p>
      <p className="text-quiet">
        Or paste it, or choose a file. SVG is best for drawings; PNG, TIFF, JPEG, WebP, AVIF, GIF and BMP are
        taken too, up to 64 MiB.
      </p>
      <FileButton words="Choose a file" onFile={onFile} />
    </div>
  );
}

export function FileButton({ words, onFile }: Props & { words: string }) {
  const alive = useHydrated();
  return (
    <FileTrigger acceptedFileTypes={TAKEN.split(',')} onSelect={(files) => files?.[0] && onFile(files[0])}>
      <Button isDisabled={!alive}>{words}</Button>
    </FileTrigger>
  );
}
