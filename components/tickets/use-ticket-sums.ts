"use client";

import { useMemo } from "react";
import { useWatch, type Control } from "react-hook-form";
import { readTicket, type Money, type ReadTicket, type TypedTicket } from "@/lib/tickets/paper";

/** The sums of the paper as it stands typed, worked out again at each keystroke with the server's own arithmetic. */
export function useTicketSums(control: Control<TypedTicket>, outfit: Money): { typed: TypedTicket; read: ReadTicket } {
  const typed = useWatch({ control }) as TypedTicket;
  const read = useMemo(() => readTicket(typed, outfit), [typed, outfit]);
  return { typed, read };
}
