import Link from "next/link";
import type { ComponentProps } from "react";

/** `act`: the one copper action of a screen. `plain`: underlined text. `off`: keeps its place and says what it waits for. */
export type ButtonKind = "act" | "outline" | "plain" | "off";

const kindClass: Record<ButtonKind, string> = {
  act: "btn btn--act",
  outline: "btn",
  plain: "btn btn--plain",
  off: "btn btn--off",
};

const classes = (kind: ButtonKind, site: boolean | undefined, more: string | undefined) =>
  [kindClass[kind], site && "btn--site", more].filter(Boolean).join(" ");

type Look = { kind?: ButtonKind; site?: boolean };

/**
 * A button. Kind `off` stays focusable and does nothing: give it `aria-describedby` with what it waits for.
 */
export function Button({
  kind = "outline",
  site,
  className,
  type = "button",
  onClick,
  ...rest
}: ComponentProps<"button"> & Look) {
  const waiting = kind === "off";
  return (
    <button
      {...rest}
      type={waiting ? "button" : type}
      aria-disabled={waiting || undefined}
      onClick={waiting ? undefined : onClick}
      className={classes(kind, site, className)}
    />
  );
}

export function ButtonLink({ kind = "outline", site, className, ...rest }: ComponentProps<typeof Link> & Look) {
  return <Link {...rest} className={classes(kind, site, className)} />;
}
