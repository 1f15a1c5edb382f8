import { useLocalSearchParams } from 'expo-router';

/** The token of a link from a mail, or null where the address holds none. */
export function useLinkToken(): string | null {
  const { token } = useLocalSearchParams();
  return typeof token === 'string' && token !== '' ? token : null;
}
