"use client";

import { useRouter } from "next/navigation";
import { useCallback, useRef } from "react";
import { useFieldArray, useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { Perf } from "@/components/ui/perf";
import { formatShortDate } from "@/lib/format";

import { emptyLine, ticketInput, type Money, type TypedTicket } from "@/lib/tickets/paper";
import { ticketInputSchema } from "@/lib/tickets/schema";
import type { PriceChoice, TicketChoices } from "./choices";
import { keepDraft, postTicket } from "./send-ticket";
import { TicketLineFields } from "./ticket-line-fields";
import { TicketHeadFields } from "./ticket-head-fields";
import { TicketLineTotals } from "./ticket-line-totals";
import { TicketStubFields } from "./ticket-stub-fields";
import { useTicketSums } from "./use-ticket-sums";

type Props = {
  slug: string;
  outfit: Money;
  today: string;
  choices: TicketChoices;
  start: TypedTicket;
  /** The draft that is being changed, or null for a new ticket. */
  kept: { id: string; version: number } | null;
  /** Whether this member may post as well as draft. */
  mayPost: boolean;
};

const priceAt = (prices: PriceChoice[], yardId: string, gradeId: string) => prices.find((price) => price.yardId === yardId && price.gradeId === gradeId);

/** Copying the yard's paper line by line, with every sum checked as it is typed. */
export function TicketForm({ slug, outfit, today, choices, start, kept, mayPost }: Props) {
  const router = useRouter();
  const accept = useRef(false);
  const { control, register, handleSubmit, setValue, getValues } = useForm<TypedTicket>({ defaultValues: start, mode: "onSubmit", shouldFocusError: false });
  const { fields, append, remove } = useFieldArray({ control, name: "lines" });
  const { typed, read } = useTicketSums(control, outfit);
  const { submit, sending, errors, errorAt } = useApiForm({
    schema: ticketInputSchema,
    send: async (input, key) => {
      const draft = await keepDraft(slug, input, kept, key);
      return accept.current ? postTicket(slug, draft.id, `${key}-post`) : draft;
    },
    onDone: (ticket) => {
      router.push(`/o/${slug}/tickets/${ticket.id}`);
      router.refresh();
    },
  });
  const send = (post: boolean) => {
    accept.current = post;
    return handleSubmit((values) => submit(ticketInput(values, outfit) as never))();
  };
  const fillLine = useCallback(
    (index: number, gradeId: string) => {
      const sheet = priceAt(choices.prices, getValues("yardId"), gradeId);
      setValue(`lines.${index}.binId`, "");
      if (!sheet) return;
      const line = getValues(`lines.${index}`);
      if (line.price === "") setValue(`lines.${index}.price`, sheet.price.replace(/(\.\d*?[1-9])0+$|\.0+$/, "$1"));
      if (line.price === "") setValue(`lines.${index}.per`, sheet.per);
      if (line.yardWording === "" && sheet.wording) setValue(`lines.${index}.yardWording`, sheet.wording);
    },
    [choices.prices, getValues, setValue],
  );
  const sheetFrom = choices.prices.find((price) => price.yardId === typed.yardId)?.inForceFrom ?? null;
  const sheetWords = sheetFrom !== null ? formatShortDate(sheetFrom, { today }) : typed.yardId === "" ? "choose the yard" : "none in force";
  const wrongSums =
    read.totalMinor !== read.totalExpected ||
    typed.paperSaysSo ||
    read.lines.some((line) => (line.netExpected !== null && line.net !== null && line.net !== line.netExpected) || line.amountMinor !== line.amountExpected);
  return (
    <form
      noValidate
      className="tk-form"
      onSubmit={(event) => {
        event.preventDefault();
        void send(mayPost);
      }}
    >
      <PageHead
        title="Sale ticket"
        fact="Copy the yard’s paper line by line. Each sum is checked as you type."
        actions={
          <>
            <Button variant={mayPost ? "line" : "filled"} type="button" aria-busy={sending} onClick={() => void send(false)}>
              Keep as draft
            </Button>
            {mayPost ? (
              <Button type="submit" aria-busy={sending}>
                Accept ticket
              </Button>
            ) : null}
          </>
        }
      />
      <ErrorSummary problems={errors.map((error) => (error.path === "" ? { message: error.message } : { field: error.path, message: error.message }))} />
      <Panel className="tk">
        <TicketHeadFields yards={choices.yards} today={today} sheetFrom={sheetWords} register={register} errorAt={errorAt} />
        <Perf />
        <h2 className="tk-title">On their ticket, and our check</h2>
        {fields.map((field, index) => {
          const line = typed.lines[index] ?? emptyLine();
          const lineRead = read.lines[index];
          if (!lineRead) return null;
          return (
            <TicketLineFields
              key={field.id}
              index={index}
              typed={line}
              read={lineRead}
              outfit={outfit}
              grades={choices.grades}
              bins={choices.bins}
              sheetPrice={sheetPriceFor(choices.prices, typed.yardId, line)}
              register={register}
              errorAt={errorAt}
              onGrade={(gradeId) => fillLine(index, gradeId)}
              onRemove={fields.length > 1 ? () => remove(index) : null}
            />
          );
        })}
        <div className="tk-add">
          <Button variant="line" onClick={() => append(emptyLine())}>
            Add a line
          </Button>
          <TicketLineTotals read={read} outfit={outfit} />
        </div>
        <Perf />
        <TicketStubFields read={read} outfit={outfit} wrongSums={wrongSums} register={register} errorAt={errorAt} />
      </Panel>
    </form>
  );
}

/** The sheet's price for a line, when the line is priced in the sheet's own unit. */
function sheetPriceFor(prices: PriceChoice[], yardId: string, line: TypedTicket["lines"][number]): string | null {
  const sheet = priceAt(prices, yardId, line.gradeId);
  return sheet && sheet.per === line.per ? sheet.price : null;
}
