import { memo } from 'react';
import { Layer, Shape } from 'react-konva/lib/ReactKonvaCore';
import { gridOf } from '@/lib/scene/grid';
import { type Size, type View, toScreen } from '@/lib/scene/view';
import type { Theme } from './theme';

/** The quiet grid, which thins out with zoom. `unit`: metres in one unit of the grid. */
export const GridLayer = memo(function GridLayer({
  view,
  size,
  unit,
  theme,
}: {
  view: View;
  size: Size;
  unit: number;
  theme: Theme;
}) {
  const { xs, ys } = gridOf(view, size, unit);
  return (
    <Layer listening={false}>
      <Shape
        sceneFunc={(context) => {
          for (const strong of [false, true]) {
            context.beginPath();
            for (const line of xs) {
              if (line.strong !== strong) continue;
              const x = Math.round(toScreen(view, [line.at, 0])[0]) + 0.5;
              context.moveTo(x, 0);
              context.lineTo(x, size.height);
            }
            for (const line of ys) {
              if (line.strong !== strong) continue;
              const y = Math.round(toScreen(view, [0, line.at])[1]) + 0.5;
              context.moveTo(0, y);
              context.lineTo(size.width, y);
            }
            context.setAttr('strokeStyle', theme.line);
            context.setAttr('globalAlpha', strong ? 0.9 : 0.38);
            context.setAttr('lineWidth', 1);
            context.stroke();
          }
        }}
      />
    </Layer>
  );
});
