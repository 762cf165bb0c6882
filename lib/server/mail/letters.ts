import { roleName, type Role } from "@/lib/notify/roles";

export type Letter = { subject: string; body: string };

const sentence = (roles: readonly Role[]): string => {
  const names = roles.map((role) => roleName[role].toLowerCase());
  return names.length < 2 ? (names[0] ?? "member") : `${names.slice(0, -1).join(", ")} and ${names.at(-1)}`;
};

/** Invitation to join a firm. `link` opens once; `days` is how long it lasts. */
export const invitationLetter = (input: {
  firmName: string;
  invitedBy: string;
  roles: readonly Role[];
  link: string;
  days: number;
}): Letter => ({
  subject: `Join ${input.firmName} on Sealwire`,
  body: [
    `${input.invitedBy} asks you to join ${input.firmName} on Sealwire as ${sentence(input.roles)}.`,
    `Open this to choose a password and start:\n${input.link}`,
    `The link works once, for ${input.days} days. If you were not expecting it, leave it alone: nothing happens.`,
  ].join("\n\n"),
});

/** A link to choose a new password. `minutes` is how long it lasts. */
export const resetLetter = (input: { name: string; link: string; minutes: number }): Letter => ({
  subject: "Choose a new Sealwire password",
  body: [
    `${input.name}, somebody asked for a new password for this address.`,
    `If it was you, open this:\n${input.link}`,
    `The link works once, for ${input.minutes} minutes. If it was not you, leave it alone: your password stays as it is.`,
  ].join("\n\n"),
});
