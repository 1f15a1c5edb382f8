const { request } = require('node:http');
const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);

// In development the bundler serves the page and hands the API on, so that both are one origin, as in the product.
const apiPort = process.env.ROWCALL_API_PORT;

const handOn = (incoming, outgoing) => {
  const { method, headers, url } = incoming;
  const onward = request({ host: '127.0.0.1', port: apiPort, method, headers, path: url }, (answer) => {
    outgoing.writeHead(answer.statusCode ?? 502, answer.headers);
    answer.pipe(outgoing);
  });
  onward.on('error', () => {
    if (!outgoing.headersSent) outgoing.writeHead(503, { 'Content-Type': 'text/plain' });
    outgoing.end('The server is starting. Try again in a moment.\n');
  });
  incoming.pipe(onward);
};

if (apiPort) {
  config.server.enhanceMiddleware = (bundler) => (incoming, outgoing, next) =>
    /^\/(api|dev)\//.test(incoming.url) ? handOn(incoming, outgoing) : bundler(incoming, outgoing, next);
}

module.exports = config;
