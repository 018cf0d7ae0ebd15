import net from "node:net";
import { Refusal } from "./say.mjs";

/** Whether nobody listens on this loopback port. */
export function isPortFree(port) {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once("error", (error) => {
      if (error.code === "EACCES") reject(new Refusal(`Port ${port} is kept for the system's administrator. Choose another one: PORT=3001 npm start`));
      else resolve(false);
    });
    server.listen({ port, host: "127.0.0.1", exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** A loopback port that nobody uses at this moment. */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once("error", reject);
    server.listen(0, "127.0.0.1", () => {
      const { port } = server.address();
      server.close(() => resolve(port));
    });
  });
}
