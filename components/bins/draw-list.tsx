import { Button } from "@/components/ui/button";
import { formatWeight } from "@/lib/format";
import { readDraws, type TypedDraw } from "./typed-draws";

type Props = {
  draws: TypedDraw[];
  unit: string;
  /** What is wrong with the draw at this place, if anything. */
  errorOf: (index: number) => string | undefined;
  onAdd: () => void;
  onRemove: (index: number) => void;
};

/** The containers already weighed for this weigh-in, each of which can be taken out again, and the way to one more. */
export function DrawList({ draws, unit, errorOf, onAdd, onRemove }: Props) {
  const before = draws.slice(0, -1);
  return (
    <div className="draws">
      {before.length > 0 ? (
        <ol>
          {before.map((draw, index) => {
            const { net } = readDraws([draw], unit);
            const error = errorOf(index);
            return (
              <li key={`${index}:${draw.gross}:${draw.tare}`}>
                <span className="n">
                  Draw {index + 1}: {draw.gross} less {draw.tare.trim() || "0"}
                </span>
                <b className="n">
                  {net === null ? "–" : formatWeight(net, { places: 2 })}
                  <span className="u">{unit}</span>
                </b>
                <Button id={`draw-${index}`} variant="line" size="sm" onClick={() => onRemove(index)}>
                  Remove<span className="vh"> draw {index + 1}</span>
                </Button>
                {error ? <p className="err">{error}</p> : null}
              </li>
            );
          })}
        </ol>
      ) : null}
      <Button variant="line" onClick={onAdd}>
        Add another draw
      </Button>
    </div>
  );
}
