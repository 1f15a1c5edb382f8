import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Link } from '@/components/ui/link';
import { PlainLink } from '@/components/ui/plain-link';
import { Text } from '@/components/ui/text';

/** Where a layout document is described, for people and for programs, and examples of it. */
export function Documents() {
  const styles = useStyles();
  return (
    <View>
      <Text variant="small" tone="soft">
        Every published board is an example: open it, then Versions, then save its layout as a file.
      </Text>
      <View style={styles.links}>
        <PlainLink href="/api/v1/layout-schema">JSON Schema</PlainLink>
        <PlainLink href="/api/v1/docs">API for scripts</PlainLink>
        <Link href="/boards" standalone>
          Published boards
        </Link>
      </View>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  links: { flexDirection: 'row', flexWrap: 'wrap', columnGap: t.space.xl },
}));
