import type { ReactNode } from 'react';
import { View, type StyleProp, type ViewStyle } from 'react-native';
import { makeStyles } from '@/components/theme';
import { createDomElement } from './dom-element';

type FormProps = {
  /** Name of the form for a screen reader. */
  label: string;
  /** Called by the Enter key in any field. Give the same function to the form's button. */
  onSubmit: () => void;
  children: ReactNode;
  style?: StyleProp<ViewStyle>;
};

/** A form: Enter submits it, and password keepers know it as one. */
export function Form({ label, onSubmit, children, style }: FormProps) {
  const styles = useStyles();
  return createDomElement('form', {
    'aria-label': label,
    noValidate: true,
    style: [styles.form, style],
    onSubmit: (event: { preventDefault: () => void }) => {
      event.preventDefault();
      onSubmit();
    },
    children: (
      <>
        {children}
        {/* Browsers submit on Enter only where a submit control exists; the visible one is a Pressable. */}
        <View aria-hidden style={styles.enter}>
          {createDomElement('input', { type: 'submit', tabIndex: -1, value: label })}
        </View>
      </>
    ),
  });
}

const useStyles = makeStyles((t) => ({
  form: { display: 'flex', flexDirection: 'column', gap: t.space.lg, margin: t.space.none },
  enter: { display: 'none' },
}));
