import { AtkinsonHyperlegibleMono_400Regular } from '@expo-google-fonts/atkinson-hyperlegible-mono/400Regular';
import { AtkinsonHyperlegibleMono_700Bold } from '@expo-google-fonts/atkinson-hyperlegible-mono/700Bold';
import { AtkinsonHyperlegibleNext_400Regular } from '@expo-google-fonts/atkinson-hyperlegible-next/400Regular';
import { AtkinsonHyperlegibleNext_700Bold } from '@expo-google-fonts/atkinson-hyperlegible-next/700Bold';
import { FontDisplay, loadAsync } from 'expo-font';

const sources = {
  'Atkinson Next': AtkinsonHyperlegibleNext_400Regular,
  'Atkinson Next Bold': AtkinsonHyperlegibleNext_700Bold,
  'Atkinson Mono': AtkinsonHyperlegibleMono_400Regular,
  'Atkinson Mono Bold': AtkinsonHyperlegibleMono_700Bold,
};

/**
 * Starts loading the four fonts that are shipped with the application.
 * Words are drawn in a system font until they arrive; a font that never arrives is no error.
 */
export async function loadFonts(): Promise<void> {
  const loads = Object.entries(sources).map(([name, uri]) => loadAsync({ [name]: { uri, display: FontDisplay.SWAP } }));
  await Promise.allSettled(loads);
}
