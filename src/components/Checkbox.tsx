import { Checkbox as AriaCheckbox, type CheckboxProps } from 'react-aria-components/Checkbox';
import type { ReactNode } from 'react';

interface Props extends Omit<CheckboxProps, 'className' | 'style' | 'children'> {
  children: ReactNode;
  wrong?: string;
}

export function Checkbox({ children, wrong, ...props }: Props) {
  return (
    <div>
      <AriaCheckbox {...props} isInvalid={Boolean(wrong)} validationBehavior="aria" className="tick">
        {({ isSelected, isIndeterminate }) => (
          <>
            <span className="tick-box" aria-hidden="true">
              <svg viewBox="0 0 20 20" className="block h-full w-full">
                {isSelected && (
                  <path d="M4 10.5 8.5 15 16 6" fill="none" stroke="currentColor" strokeWidth="2.2" />
                )}
                {isIndeterminate && <path d="M4 10 H16" stroke="var(--ink)" strokeWidth="2.2" />}
              </svg>
            </span>
            <span>{children}</span>
          </>
        )}
      </AriaCheckbox>
      {wrong && (
        <p className="field-wrong" role="alert">
          {wrong}
        </p>
      )}
    </div>
  );
}
