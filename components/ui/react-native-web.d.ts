import 'react-native';

// What react-native-web forwards to the page and React Native's own types do not name.
declare module 'react-native' {
  interface AccessibilityProps {
    'aria-atomic'?: boolean;
    'aria-colcount'?: number;
    'aria-colindex'?: number;
    'aria-controls'?: string;
    'aria-current'?: boolean | 'page' | 'step' | 'location' | 'true';
    'aria-describedby'?: string;
    'aria-errormessage'?: string;
    'aria-haspopup'?: boolean | 'dialog' | 'menu' | 'listbox' | 'grid';
    'aria-invalid'?: boolean;
    'aria-keyshortcuts'?: string;
    'aria-level'?: number;
    'aria-orientation'?: 'horizontal' | 'vertical';
    'aria-posinset'?: number;
    'aria-pressed'?: boolean;
    'aria-required'?: boolean;
    'aria-roledescription'?: string;
    'aria-rowcount'?: number;
    'aria-rowindex'?: number;
    'aria-setsize'?: number;
    'aria-sort'?: 'ascending' | 'descending' | 'none';
  }
  interface ViewProps {
    /** Becomes data-* attributes; see the print rules of the theme: `dataSet={{ print: 'hide' }}`. */
    dataSet?: Record<string, string>;
    onKeyDown?: (event: React.KeyboardEvent) => void;
  }
  interface PressableStateCallbackType {
    readonly hovered?: boolean;
    readonly focused?: boolean;
  }
}
