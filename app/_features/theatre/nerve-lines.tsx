import { ScenePicture } from '@/app/_ui/scene-picture';
import type { NerveLineView } from '@/lib/chart/nerve-line';
import { nerveLineScene } from '@/lib/chart/nerve-line-scene';

interface NerveLinesProps {
  readonly views: readonly NerveLineView[];
  readonly widthPx: number;
  readonly textPx: number;
  readonly hasAges: boolean;
  readonly emphasis: number;
}

/** The nerves of the case over the whole width, each drawn to scale; several share the height. */
export function NerveLines({ views, widthPx, textPx, hasAges, emphasis }: NerveLinesProps) {
  const isAlone = views.length === 1;
  return (
    <div className="flex flex-1 shrink-0 flex-col justify-evenly gap-[0.35em] px-(--edge-room) py-[0.35em] text-(length:--needed)">
      {views.map((view) => (
        <ScenePicture
          key={view.nerveId}
          scene={nerveLineScene(isAlone ? view : named(view), { widthPx, textPx, hasAges, emphasis: isAlone ? emphasis : 1 })}
          className="block"
        />
      ))}
    </div>
  );
}

/** Beside another nerve, the name stands at the end of the line, over the channel. */
function named(view: NerveLineView): NerveLineView {
  return view.end === null ? view : { ...view, end: { ...view.end, caption: view.nerveName } };
}
