import { palettes, type Colours, type ThemeName } from './colours';
import { headerHeight, layer, line, measure, radius, space, target } from './scale';
import { textStyles } from './type';

/** Everything a component may use to draw itself. */
export type Theme = {
  name: ThemeName;
  colours: Colours;
  space: typeof space;
  line: typeof line;
  radius: typeof radius;
  target: typeof target;
  measure: typeof measure;
  headerHeight: typeof headerHeight;
  layer: typeof layer;
  text: typeof textStyles;
};

const build = (name: ThemeName): Theme => ({
  name,
  colours: palettes[name],
  space,
  line,
  radius,
  target,
  measure,
  headerHeight,
  layer,
  text: textStyles,
});

/** Both themes, built once, so that styles can be cached by theme. */
export const themes: Record<ThemeName, Theme> = { day: build('day'), night: build('night') };
