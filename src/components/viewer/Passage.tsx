import { ToggleButton } from 'react-aria-components/ToggleButton';
import { PASSAGE, type PassagePicture } from '@/lib/prepare/report';
import { PICTURE_WORDS, type ViewerPicture } from './pictures';

interface Props {
  pictures: readonly ViewerPicture[];
  /** one or two names; with two the first is on the left */
  compared: readonly PassagePicture[];
  onChoose: (name: PassagePicture) => void;
}

/** Five small pictures, from what was sent to what will be burned. Choosing two compares them. */
export function Passage({ pictures, compared, onChoose }: Props) {
  return (
    <section aria-label="Passage: choose two pictures to compare">
      <ol className="grid grid-cols-5 gap-2 md:gap-4">
        {PASSAGE.map((name) => {
          const picture = pictures.find((p) => p.name === name);
          const chosen = compared.indexOf(name);
          return (
            <li key={name} className="min-w-0">
              <ToggleButton
                isSelected={chosen >= 0}
                isDisabled={!picture}
                onChange={() => onChoose(name)}
                aria-label={`${PICTURE_WORDS[name].name}, ${PICTURE_WORDS[name].words}`}
                className="flex w-full cursor-pointer flex-col gap-1 border-b-2 border-transparent pb-1 text-left disabled:cursor-default data-[selected]:border-action"
              >
                <span className="flex aspect-[2/1] w-full items-center justify-center overflow-hidden bg-well p-1">
                  {picture && (
                    <img src={picture.url} alt="" className="max-h-full max-w-full object-contain" />
                  )}
                </span>
                <span
                  className={`truncate text-13 ${picture ? 'text-ink' : 'text-quiet'} ${chosen >= 0 ? 'font-semibold' : ''}`}
                >
                  {PICTURE_WORDS[name].name}
                </span>
              </ToggleButton>
            </li>
          );
        })}
      </ol>
    </section>
  );
}
