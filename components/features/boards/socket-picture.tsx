import { useMemo } from 'react';
import { View } from 'react-native';
import { ScreenSketch } from '@/components/features/diagnose/picture/screen-sketch';
import { makeStyles } from '@/components/theme';
import { Text } from '@/components/ui/text';
import { markOnGlass, pictureOfChip, type LayoutIndex, type SocketIndex } from '@/lib';
import { sentenceCase } from '@/lib/layout/words';

type SocketPictureProps = { index: LayoutIndex; at: SocketIndex };

/** Places of the picture that are drawn; more are told in words. */
const mostDrawn = 60;

/** Height of the sketch, px: it stands among other facts of the socket. */
const greatestHeight = 180;

/** How the picture looks when the chip of a socket fails; nothing on a board whose memory is not a picture. */
export function SocketPicture({ index, at }: SocketPictureProps) {
  const styles = useStyles();
  const map = index.document.screenMap;
  const picture = useMemo(() => pictureOfChip(index, { socket: at }), [index, at]);
  const marks = useMemo(
    () => (map === undefined ? [] : (picture?.marks ?? []).flatMap((mark) => markOnGlass(map, mark))),
    [map, picture],
  );
  if (map === undefined || picture === null) return null;
  const words = picture.words.map((each) => `${sentenceCase(each)}.`);
  return (
    <View style={styles.part}>
      <Text variant="subheading">The picture when it fails</Text>
      {words.length === 0 ? <Text tone="soft">The screen shows nothing of this chip.</Text> : null}
      {marks.length === 0 ? null : (
        <ScreenSketch
          map={map}
          marks={marks.slice(0, mostDrawn)}
          label={`The screen when it fails. ${words.join(' ')}`}
          greatestHeight={greatestHeight}
        />
      )}
      {words.map((each) => (
        <Text key={each}>{each}</Text>
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ part: { gap: t.space.sm } }));
