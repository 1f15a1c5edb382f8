import { G, Path, Text as SvgText } from 'react-native-svg';
import { sketchScale } from '@/components/theme/sketch-scale';
import type { Edge } from './geometry';
import type { Fit } from './geometry-fit';
import type { Axes } from './geometry-grid';
import { fitLabel, fitWords } from './geometry-label';
import type { Inks } from './sketch-inks';

const { axis, axisStrong, font, words, gap, leastWords, margin, line } = sketchScale;

/** Names of banks and bits along the left and the top. For the eye: each socket says the same by itself. */
export function SketchAxes({ axes, fit, inks }: { axes: Axes; fit: Fit; inks: Inks }) {
  const { rows, columns } = axes;
  const left = fit.namesAt;
  const top = fit.array.y - fit.array.height / 2;
  const across = (columns?.names ?? []).map(({ at }) => at * fit.scale);
  const pitch = Math.min(...across.slice(1).map((x, n) => x - (across[n] as number)));
  const header = top - margin;
  const hidden: object = { 'aria-hidden': true };
  return (
    <G {...hidden}>
      {columns ? (
        <SvgText x={left} y={header} fontFamily={font.text} fontSize={axis} fill={inks.soft}>
          {columns.kind}
        </SvgText>
      ) : null}
      {columns?.names.map(({ at, text }) => {
        const fitting = { width: Math.min(pitch * 0.9, fit.array.width), least: leastWords, most: axis };
        const fitted = fitWords([text], fitting) ?? fitLabel(text, fitting);
        if (!fitted) return null;
        const { x } = fit.toPx({ x: at, y: 0, width: 0, height: 0 });
        return (
          <SvgText
            key={at}
            x={x}
            y={header}
            textAnchor="middle"
            fontFamily={font.text}
            fontSize={fitted.size}
            fill={inks.soft}
          >
            {fitted.text}
          </SvgText>
        );
      })}
      {rows?.names.map(({ at, text }, n) => {
        const { y } = fit.toPx({ x: 0, y: at, width: 0, height: 0 });
        const fitted = fitLabel(text, { width: fit.namesWidth, least: leastWords, most: axisStrong });
        const before = rows.names[n - 1];
        const twoLines =
          rows.names.length < 2 || fit.scale * Math.abs(at - (before ?? rows.names[1] ?? { at: 0 }).at) > 2.6 * axis;
        return (
          <G key={at}>
            {twoLines ? (
              <SvgText x={left} y={y - gap.small} fontFamily={font.text} fontSize={words} fill={inks.soft}>
                {rows.kind}
              </SvgText>
            ) : null}
            <SvgText
              x={left}
              y={twoLines ? y + axisStrong * 0.9 : y + axisStrong * 0.34}
              fontFamily={font.monoBold}
              fontSize={fitted?.size ?? leastWords}
              fill={inks.ink}
            >
              {fitted?.text ?? ''}
            </SvgText>
          </G>
        );
      })}
    </G>
  );
}

/** The connector: a line with short teeth along its edge of the board, and its name. */
export function SketchEdge({ edge, name, fit, inks }: { edge: Edge; name: string; fit: Fit; inks: Inks }) {
  const { array } = fit;
  const upright = edge === 'left' || edge === 'right';
  const length = upright ? array.height : array.width;
  const away = (upright ? array.width : array.height) / 2 + fit.edgeAway;
  const tooth = gap.small + gap.hair;
  const pitch = 3 * gap.small;
  const teeth = Math.max(1, Math.floor(length / pitch));
  let path = `M${-length / 2} 0H${length / 2}`;
  for (let n = 0; n <= teeth; n++) path += `M${((n / teeth) * 2 - 1) * (length / 2)} 0v${tooth}`;
  // Drawn as at the bottom, then turned; words at the left and right are read from below.
  const angle = { bottom: 0, left: 90, top: 180, right: -90 }[edge];
  const at = {
    x: array.x + (edge === 'left' ? -away : edge === 'right' ? away : 0),
    y: array.y + (edge === 'top' ? -away : edge === 'bottom' ? away : 0),
  };
  const wordsAway = tooth + words;
  const wordsAt = {
    bottom: `translate(0 ${wordsAway})`,
    top: `translate(0 ${-tooth - gap.small})`,
    left: `translate(${-tooth - gap.small} 0) rotate(-90)`,
    right: `translate(${wordsAway} 0) rotate(-90)`,
  }[edge];
  const fitted = fitWords([name], { width: length, least: leastWords, most: words });
  const hidden: object = { 'aria-hidden': true };
  return (
    <G {...hidden} transform={`translate(${at.x} ${at.y})`}>
      <G transform={`rotate(${angle})`}>
        <Path d={path} fill="none" stroke={inks.soft} strokeWidth={line.body} />
      </G>
      {fitted ? (
        <G transform={wordsAt}>
          <SvgText textAnchor="middle" fontFamily={font.text} fontSize={fitted.size} fill={inks.soft}>
            {name}
          </SvgText>
        </G>
      ) : null}
    </G>
  );
}
