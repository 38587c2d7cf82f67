import type { Scene, Shape } from '@/lib/chart/scene';

import { joinClasses } from '@/app/_ui/join-classes';

/** Draws a scene of `lib/chart` as vectors. One image to a screen reader, with the scene's own sentence. */
export function ScenePicture({ scene, className }: { readonly scene: Scene; readonly className?: string }) {
  return (
    <svg
      role="img"
      aria-label={scene.description}
      width={scene.widthPx}
      height={scene.heightPx}
      viewBox={`0 0 ${scene.widthPx} ${scene.heightPx}`}
      className={className}
    >
      {scene.shapes.map((shape) => (
        <ShapeElement key={shape.key} shape={shape} />
      ))}
    </svg>
  );
}

function ShapeElement({ shape }: { readonly shape: Shape }) {
  const tone = `scene-${shape.tone}`;
  switch (shape.kind) {
    case 'line':
      return (
        <line
          className={joinClasses(tone, 'scene-stroke scene-moves')}
          x1={shape.x1}
          x2={shape.x2}
          y1={shape.y1}
          y2={shape.y2}
          strokeWidth={shape.widthPx}
          strokeDasharray={shape.dashPx?.join(' ')}
          strokeDashoffset={shape.dashOffsetPx}
        />
      );
    case 'rect':
      return (
        <rect
          className={joinClasses(tone, shape.strokePx === null ? 'scene-fill' : 'scene-stroke')}
          x={shape.x}
          y={shape.y}
          width={shape.widthPx}
          height={shape.heightPx}
          strokeWidth={shape.strokePx ?? undefined}
          strokeDasharray={shape.dashPx?.join(' ')}
        />
      );
    case 'node':
      return (
        <circle
          className={joinClasses(tone, shape.strokePx === null ? 'scene-fill' : 'scene-node')}
          cx={shape.x}
          cy={shape.y}
          r={shape.radiusPx}
          strokeWidth={shape.strokePx ?? undefined}
        />
      );
    case 'text':
      return (
        <text
          className={joinClasses(tone, 'scene-text', shape.isMono ? 'font-mono' : 'font-sans')}
          x={shape.x}
          y={shape.y}
          fontSize={shape.sizePx}
          fontWeight={shape.isBold ? 700 : 400}
          textAnchor="middle"
        >
          {shape.text}
        </text>
      );
  }
}
