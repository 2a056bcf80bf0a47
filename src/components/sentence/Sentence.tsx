import { useState } from 'react';
import { changedChoices, instructionParts, putBack } from '@/lib/orders/sentence';
import type { Design } from '@/lib/orders/views';
import { Button } from '../Button';
import { ChoicePopover } from '../ChoicePopover';
import { AllFigures } from './AllFigures';
import { Choice, CHOICE_TITLES } from './Choice';
import type { ChoiceContext } from './context';

interface Props {
  design: Design;
  /** what "put back" goes back to: the choices of the last preparation, or those it started from */
  before: Design;
  context: ChoiceContext;
  onChange: (design: Design) => void;
  isDisabled?: boolean;
}

/** The instruction as prose: every underlined word opens its own choice, every changed word can be put back. */
export function Sentence({ design, before, context, onChange, isDisabled = false }: Props) {
  const [allOpen, setAllOpen] = useState(false);
  const changed = changedChoices(before, design, context);
  return (
    <section aria-label="Instruction" className="flex flex-col items-start gap-2">
      <p className="sentence">
        {instructionParts(design, context).map((part, index) => {
          const { choice } = part;
          if (!choice || isDisabled) return <span key={choice ?? index}>{part.text}</span>;
          return (
            <span key={choice}>
              <ChoicePopover word={part.text} title={CHOICE_TITLES[choice]}>
                <Choice id={choice} design={design} context={context} onChange={onChange} />
              </ChoicePopover>
              {changed.includes(choice) && (
                <>
                  {' '}
                  <button
                    type="button"
                    className="put-back"
                    onClick={() => onChange(putBack(choice, before, design))}
                  >
                    Put back<span className="hidden-words"> {CHOICE_TITLES[choice].toLowerCase()}</span>
                  </button>
                </>
              )}
            </span>
          );
        })}
      </p>
      {!isDisabled && (
        <>
          <span className="-ml-2">
            <Button kind="text" onPress={() => setAllOpen(true)}>
              All figures
            </Button>
          </span>
          {allOpen && (
            <AllFigures
              design={design}
              context={context}
              onChange={onChange}
              onClose={() => setAllOpen(false)}
            />
          )}
        </>
      )}
    </section>
  );
}
