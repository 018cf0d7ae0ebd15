"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { Dock } from "@/components/ui/dock";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Icon } from "@/components/ui/icons";
import { LiveRegion } from "@/components/ui/live-region";
import { PhoneBar } from "@/components/ui/phone-bar";
import { Readout } from "@/components/ui/readout";
import { add, isPositive } from "@/lib/arithmetic/decimal";
import { weighInInputSchema, type Bin, type WeighIn } from "@/lib/bins/schema";
import { formatWeight } from "@/lib/format";
import { apiSend } from "@/lib/http/fetch";
import { BinPicker } from "./bin-picker";
import { DrawList } from "./draw-list";
import { GradePicker, type GradeChoice } from "./grade-picker";
import { SourcePicker, type LotChoice, type Source } from "./source-picker";
import { TodaysWeighIns } from "./todays-weigh-ins";
import { addDraw, drawsOf, fieldOf, readDraws, typedTare, type TypedDraw } from "./typed-draws";
import { useWakeLock } from "./use-wake-lock";

type Props = {
  slug: string;
  unit: "lb" | "kg";
  timeZone: string;
  today: string;
  screen: { bins: Bin[]; grades: GradeChoice[]; lots: LotChoice[]; today: WeighIn[] };
  memberId: string;
  isOwner: boolean;
  mayAddBin: boolean;
  presetPickup: LotChoice | null;
  presetBin: string | null;
};

const booked = ({ net, binLabel, binBalance }: WeighIn, unit: string) =>
  `${formatWeight(net, { places: 2 })} ${unit} in ${binLabel}, which holds ${formatWeight(binBalance)} ${unit}.`;

/** The bench scale's screen: choose the grade and its bin, type gross and tare, put it in. */
export function WeighInForm(props: Props) {
  const { slug, unit, screen, today } = props;
  const router = useRouter();
  const grossRef = useRef<HTMLInputElement>(null);
  const firstBin = screen.bins.find((bin) => bin.id === props.presetBin) ?? screen.bins.find((bin) => bin.gradeId === screen.grades[0]?.id);
  const [gradeId, setGradeId] = useState(firstBin?.gradeId ?? "");
  const [binId, setBinId] = useState(firstBin?.id ?? "");
  const [draws, setDraws] = useState<TypedDraw[]>([{ gross: "", tare: typedTare(firstBin?.tare ?? "0") }]);
  const [source, setSource] = useState<Source>(props.presetPickup ? { from: "pickup", lot: props.presetPickup } : { from: "outside" });
  const [made, setMade] = useState<WeighIn | null>(null);
  useWakeLock();
  const bin = screen.bins.find((one) => one.id === binId);
  const read = readDraws(draws, unit);
  const last = draws.at(-1) ?? { gross: "", tare: "" };
  const { submit, sending, errors } = useApiForm<typeof weighInInputSchema, WeighIn>({
    schema: weighInInputSchema,
    send: (input, idempotencyKey) => apiSend(`/api/o/${slug}/weigh-ins`, { body: input, idempotencyKey }),
    onDone: (weighIn) => {
      setMade(weighIn);
      setDraws([{ gross: "", tare: typedTare(bin?.tare ?? "0") }]);
      grossRef.current?.focus();
      router.refresh();
    },
  });
  const chooseBin = (next: Bin | undefined) => {
    setBinId(next?.id ?? "");
    setDraws([...draws.slice(0, -1), { gross: last.gross, tare: typedTare(next?.tare ?? "0") }]);
  };
  const chooseGrade = (id: string) => {
    setGradeId(id);
    chooseBin(screen.bins.find((one) => one.gradeId === id));
  };
  const change = (field: keyof TypedDraw) => (event: { target: { value: string } }) =>
    setDraws([...draws.slice(0, -1), { ...last, [field]: event.target.value }]);
  const send = () => {
    const from = source.from === "pickup" ? { pickupId: source.lot.id } : source.from === "pile" ? { fromPile: true } : {};
    setMade(null);
    return submit({ binId, weighedOn: today, ...drawsOf(draws, unit), ...from } as never);
  };
  // What was said of a weigh-in is no longer so once it is taken back.
  const stands = screen.today.some((one) => one.id === made?.id && one.voidedAt !== null) ? null : made;
  const messageAt = (field: string) => errors.find(({ path }) => fieldOf(path, draws.length) === field)?.message;
  const wrong = (field: string) => {
    const error = messageAt(field);
    return error ? { error } : {};
  };
  return (
    <form
      noValidate
      className="phone"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <PhoneBar
        back={{ href: `/o/${slug}/bins`, label: "Back to bins" }}
        title="Weigh in"
        fact={
          <>
            <Icon name="scale" /> Bench scale
          </>
        }
      />
      <div className="body weigh">
        <ErrorSummary problems={errors.map(({ path, message }) => (path === "" ? { message } : { field: fieldOf(path, draws.length), message }))} />
        <GradePicker grades={screen.grades} chosen={gradeId} onChoose={chooseGrade} />
        <BinPicker
          slug={slug}
          bins={screen.bins.filter((one) => one.gradeId === gradeId)}
          gradeId={gradeId}
          chosen={binId}
          unit={unit}
          mayAdd={props.mayAddBin}
          onChoose={chooseBin}
        />
        <Readout
          unit={unit}
          net={read.net === null ? "–" : formatWeight(read.net, { places: 2 })}
          gross={{ id: "gross", ref: grossRef, value: last.gross, onChange: change("gross"), ...wrong("gross") }}
          tare={{ id: "tare", value: last.tare, onChange: change("tare"), ...wrong("tare") }}
          netLabel={draws.length > 1 ? `net of ${draws.length} draws` : "net"}
        />
        <DrawList
          draws={draws}
          unit={unit}
          errorOf={(index) => messageAt(`draw-${index}`)}
          onAdd={() => {
            setDraws(addDraw(draws, typedTare(bin?.tare ?? "0"), unit));
            grossRef.current?.focus();
          }}
          onRemove={(index) => {
            setDraws(draws.filter((_, at) => at !== index));
            grossRef.current?.focus();
          }}
        />
        <SourcePicker lots={screen.lots} source={source} unit={unit} onChange={setSource} error={messageAt("pickupId")} />
        <LiveRegion className="done">{stands ? booked(stands, unit) : null}</LiveRegion>
        <TodaysWeighIns slug={slug} weighIns={screen.today} unit={unit} timeZone={props.timeZone} memberId={props.memberId} isOwner={props.isOwner} />
      </div>
      <Dock>
        <BigButton
          verb="Put in bin"
          busy={sending}
          consequence={
            bin && read.net !== null && isPositive(read.net) ? `${bin.label} will hold ${formatWeight(add(bin.balance, read.net))} ${unit}` : (bin?.label ?? "")
          }
        />
      </Dock>
    </form>
  );
}
