const http = require('node:http');
const { getDefaultConfig } = require('expo/metro-config');
const { insteadOf } = require('./scripts/leaveOut.cjs');

const config = getDefaultConfig(__dirname);

// Database files, exports and logs are no sources: crawling them is slow and may not be allowed.
const outside = [/^\/\.postgres\/.*/, /^\/\.data\/.*/, /^\/\.build\/.*/, /^\/dist\/.*/].map(
  (pattern) => new RegExp(`^${__dirname.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}${pattern.source.slice(1)}`),
);
config.resolver.blockList = [config.resolver.blockList].flat().filter(Boolean).concat(outside);

// In development the client comes from Metro and the API from the server behind it, under one address.
config.server.enhanceMiddleware = (middleware) => (request, response, next) => {
  if (!request.url.startsWith('/api/')) return middleware(request, response, next);
  const target = new URL(process.env.KARYA_API_URL || 'http://127.0.0.1:4680');
  const onward = http.request(
    { host: target.hostname, port: target.port, path: request.url, method: request.method, headers: request.headers },
    (answer) => {
      response.writeHead(answer.statusCode, answer.headers);
      answer.pipe(response);
    },
  );
  onward.on('error', () => response.writeHead(502).end('The server does not answer yet.'));
  request.pipe(onward);
};

const resolveAsUsual = config.resolver.resolveRequest;
config.resolver.resolveRequest = (context, name, platform) => {
  const resolve = resolveAsUsual ?? context.resolveRequest;
  const instead = platform === 'web' ? insteadOf(context.originModulePath, name) : undefined;
  if (instead === null) return { type: 'empty' };
  return resolve(context, instead ?? name, platform);
};

module.exports = config;
