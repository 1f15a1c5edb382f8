import { useRef } from 'react';
import { Button, type ButtonProps } from './button';
import { createDomElement } from './dom-element';

/** Props of FileButton. */
export type FileButtonProps = {
  label: string;
  /** What the file is, for those who reach the field itself. */
  inputLabel: string;
  kind?: ButtonProps['kind'];
  /** Which files are offered, as the browser takes it. Left out: all. */
  accept?: string;
  onFile: (file: File) => void;
};

/** A button that lets the person choose a file of this device. */
export function FileButton({ label, inputLabel, kind, accept, onFile }: FileButtonProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <>
      <Button kind={kind} label={label} onPress={() => input.current?.click()} />
      {createDomElement('input', {
        ref: input,
        type: 'file',
        accept,
        'aria-label': inputLabel,
        tabIndex: -1,
        style: hidden,
        onChange: ({ target }: { target: HTMLInputElement }) => {
          const file = target.files?.[0];
          if (file) onFile(file);
          // The same file can be chosen again after it has changed.
          target.value = '';
        },
      })}
    </>
  );
}

const hidden = { display: 'none' } as const;
