import { createServer, type AddressInfo, type Socket } from "node:net";

/** How the server answers, from the greeting on. `cut` closes the connection after the whole mail has arrived. */
export type SmtpMode = "takes" | "silent" | "rubbish" | "refuses" | "busy" | "cut" | "hangs-after-data";

/** A mail server that speaks just enough SMTP (RFC 5321) and can misbehave at each stage. */
export async function fakeSmtp(mode: SmtpMode) {
  const mails: string[] = [];
  const sockets = new Set<Socket>();

  function converse(socket: Socket) {
    let inData = false;
    let heard = "";
    const say = (line: string) => socket.write(`${line}\r\n`);
    const finish = () => {
      mails.push(heard);
      heard = "";
      inData = false;
      if (mode === "cut") socket.destroy();
      else if (mode !== "hangs-after-data") say("250 taken");
    };
    const command = (line: string) => {
      const verb = line.slice(0, 4).toUpperCase();
      if (verb === "RCPT" && mode === "refuses") return say("550 no such mailbox");
      if (verb === "RCPT" && mode === "busy") return say("451 try later");
      if (verb === "DATA") {
        inData = true;
        heard = "";
        return say("354 go on");
      }
      return say(verb === "QUIT" ? "221 bye" : "250 ok");
    };
    socket.on("data", (chunk) => {
      heard += chunk.toString("latin1");
      if (inData) return void (heard.endsWith("\r\n.\r\n") && finish());
      for (let end = heard.indexOf("\r\n"); end >= 0 && !inData; end = heard.indexOf("\r\n")) {
        const line = heard.slice(0, end);
        heard = heard.slice(end + 2);
        command(line);
      }
    });
    if (mode === "rubbish") say("<h1>hello</h1>");
    else if (mode !== "silent") say("220 test");
  }

  const server = createServer((socket) => {
    sockets.add(socket);
    socket.on("error", () => sockets.delete(socket));
    converse(socket);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  return {
    url: `smtp://127.0.0.1:${(server.address() as AddressInfo).port}`,
    mails,
    close: () => {
      for (const socket of sockets) socket.destroy();
      return new Promise<void>((resolve) => server.close(() => resolve()));
    },
  };
}
