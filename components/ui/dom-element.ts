/**
 * A DOM element that takes React Native styles, for the few that React Native has no name for: `form`, `label`.
 * Imported by its own path, because the package's index would bring all of react-native-web.
 */
export { default as createDomElement } from 'react-native-web/dist/exports/createElement';
