import net from "node:net";

/** A port on 127.0.0.1, held so that nobody else takes it before its user is started. */
export interface ReservedPort {
  port: number;
  release: () => Promise<void>;
}

function listen(port: number): Promise<ReservedPort> {
  return new Promise((resolve, reject) => {
    const server = net.createServer((socket) => socket.destroy());
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => {
      const address = server.address() as net.AddressInfo; // a TCP server listening has this form
      resolve({ port: address.port, release: () => new Promise((done) => server.close(() => done())) });
    });
  });
}

/** The preferred port, or any free one when it is taken or closed to us. 0 asks for any. */
export async function reservePort(preferred: number): Promise<ReservedPort> {
  try {
    return await listen(preferred);
  } catch {
    return listen(0);
  }
}
