import { joinClasses } from '@/app/_ui/join-classes';
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
    <div className="flex flex-1 shrink-0 flex-col justify-evenly gap-[0.6em] px-(--edge-room) py-[0.5em] text-(length:--needed)">
      {views.map((view) => (
        <figure key={view.nerveId}>
          <figcaption className={joinClasses('leading-none font-bold', isAlone && 'sr-only')}>{view.nerveName}</figcaption>
          <ScenePicture scene={nerveLineScene(view, { widthPx, textPx, hasAges, emphasis: isAlone ? emphasis : 1 })} className="block" />
        </figure>
      ))}
    </div>
  );
}
