// Preloaded into the built program: whoever asks for a socket, a name or a request ends the program with status 97.
import dgram from 'node:dgram';
import dns from 'node:dns';
import http from 'node:http';
import https from 'node:https';
import { syncBuiltinESMExports } from 'node:module';
import net from 'node:net';
import tls from 'node:tls';

function refuse() {
  process.stderr.write('a socket was asked for\n');
  process.exit(97);
}

net.Socket.prototype.connect = refuse;
net.Server.prototype.listen = refuse;
net.connect = refuse;
net.createConnection = refuse;
tls.connect = refuse;
dgram.createSocket = refuse;
for (const way of ['lookup', 'resolve', 'resolve4', 'resolve6']) {
  dns[way] = refuse;
  dns.promises[way] = refuse;
}
for (const requests of [http, https]) {
  requests.request = refuse;
  requests.get = refuse;
}
globalThis.fetch = refuse;
syncBuiltinESMExports();
