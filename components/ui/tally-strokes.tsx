import { View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { makeStyles, useTheme } from '@/components/theme';
import { percentWords, tallyCount } from './percent';
import { Text } from './text';

type TallyStrokesProps = {
  /** 0 to 1. */
  probability: number;
  /** Strokes above the number as in the answer, or beside it as in a list. */
  layout?: 'above' | 'beside';
  size?: 'md' | 'lg';
};

// Two fives, each four upright strokes and one across, drawn by a hand that is not quite steady. Units of the view box.
const fiveUpright = ['M6 4 L4.5 26', 'M13 3 L12 26.5', 'M20 4.5 L19.5 26', 'M27 3 L26.5 25.5'];
const across = 'M1 24 L34 8';
const apart = 48;
const [boxWidth, boxHeight] = [84, 30] as const;

/** A probability as tally strokes, one a tenth, with the number in words beside them. */
export function TallyStrokes({ probability, layout = 'above', size = 'md' }: TallyStrokesProps) {
  const styles = useStyles();
  const { colours, line } = useTheme();
  const drawn = tallyCount(probability);
  const strokes = [0, apart].flatMap((shift) => [...fiveUpright, across].map((d) => ({ d, shift })));
  return (
    <View style={layout === 'above' ? styles.above : styles.beside}>
      <View aria-hidden style={size === 'lg' ? styles.large : styles.middle}>
        <Svg width="100%" height="100%" viewBox={`0 0 ${boxWidth} ${boxHeight}`}>
          {/* Faint strokes first, so that the drawn ones lie on top. */}
          {strokes
            .map((stroke, at) => ({ ...stroke, faint: at >= drawn }))
            .sort((a, b) => Number(b.faint) - Number(a.faint))
            .map(({ d, shift, faint }) => (
              <Path
                key={`${shift}${d}`}
                d={d}
                transform={`translate(${shift} 0)`}
                stroke={faint ? colours.ruleStrong : colours.ink}
                strokeWidth={line.ink}
                strokeLinecap="round"
                fill="none"
              />
            ))}
        </Svg>
      </View>
      <Text variant={size === 'lg' ? 'heading' : 'strong'} level={null}>
        {percentWords(probability)}
      </Text>
    </View>
  );
}

const useStyles = makeStyles((t) => ({
  above: { alignItems: 'flex-end', gap: t.space.xs },
  beside: { flexDirection: 'row', alignItems: 'center', gap: t.space.sm },
  middle: { width: t.target * 1.5, aspectRatio: boxWidth / boxHeight },
  large: { width: t.target * 2, aspectRatio: boxWidth / boxHeight },
}));
