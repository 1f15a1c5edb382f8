declare module 'react-native-web/dist/exports/createElement' {
  /** Makes a DOM element whose `style` is a React Native style. */
  export default function createElement(tag: string, props: Record<string, unknown>): import('react').ReactElement;
}
