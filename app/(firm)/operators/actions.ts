"use server";

import { z } from "zod";
import { saveOperatorSettings } from "@/db/queries/operators";
import { addOperator, changeOperator, removeOperator } from "@/db/queries/operators-own";
import { viewerAction } from "@/lib/server/actions";

const blankIsNull = (value: unknown) => (typeof value === "string" && value.trim() === "" ? null : value);
const perhaps = <S extends z.ZodType>(schema: S) => z.preprocess(blankIsNull, schema.nullable());
const address = z.email({ error: "Enter an e-mail address, or leave it blank" }).max(254);
const day = z.iso.date({ error: "Enter a day, such as 2026-12-01" });
const sourceNote = z.string().trim().max(200, "Use 200 characters or fewer");
const ground = z.object({ from: perhaps(day), source: perhaps(sourceNote) }).optional();
const amperes = (most: number) =>
  z.coerce
    .number({ error: "Enter a number of amperes" })
    .positive("Must be more than 0 A")
    .max(most, `${most} A is the most`);

/** Keeps what the firm knows of an operator. A looser figure is taken: the rules use it and print it. */
export const saveSettingsAct = viewerAction(
  z.object({
    operatorId: z.string().max(4),
    noticeEmail: perhaps(address),
    applicationEmail: perhaps(address),
    phone: perhaps(z.string().trim().max(40, "Use 40 characters or fewer")),
    page: perhaps(z.url({ protocol: /^https$/, error: "Enter an address that begins https://" }).max(300)),
    noticeDays: perhaps(
      z.coerce
        .number({ error: "Enter a number of days" })
        .int("Enter whole days")
        .min(0, "0 is the least")
        .max(90, "90 days is the most"),
    ),
    buriedSeparationM: perhaps(
      z.coerce
        .number({ error: "Enter a distance in metres, such as 3.5" })
        .positive("Must be more than 0 m")
        .max(100, "100 m is the most"),
    ),
    asksFirstAboveA: perhaps(amperes(400)),
    assumesFuseA: perhaps(amperes(400)),
    grounds: z.object({
      noticeDays: ground,
      buriedSeparationM: ground,
      asksFirstAboveA: ground,
      assumesFuseA: ground,
    }),
    note: perhaps(z.string().trim().max(2000, "Use 2,000 characters or fewer")),
  }),
  saveOperatorSettings,
);

const ownEntry = z.object({
  operatorId: z
    .string()
    .trim()
    .regex(/^\d{2}$/, "Enter two digits"),
  name: z.string().trim().min(1, "Enter the operator’s name").max(120, "Use 120 characters or fewer"),
  kind: z.enum(["dno", "idno"]),
  division: perhaps(z.enum(["england-and-wales", "scotland"])),
  from: day,
  source: sourceNote.min(1, "Say who told the firm, or what it read"),
});

/** Enters an operator for a distributor id that the register lacks. */
export const addOperatorAct = viewerAction(ownEntry, addOperator);

export const changeOperatorAct = viewerAction(ownEntry, changeOperator);

export const removeOperatorAct = viewerAction(z.object({ operatorId: z.string().max(4) }), removeOperator);
