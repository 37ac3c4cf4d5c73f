const http = require('node:http');
const path = require('node:path');
const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);
// Metro's default asset list has ttf and otf but not woff2.
config.resolver.assetExts.push('woff2');
// The folders below never ship with the web client; watching them only costs time.
const root = __dirname.replace(/[\\^$.*+?()[\]{}|]/g, '\\$&');
config.resolver.blockList = [new RegExp(`^${root}[/\\\\](var|build|dist|coverage)[/\\\\]`)];
// zod's main entry pulls in some fifty message locales, about half of its size: keep English only.
const zodLocales = path.join(__dirname, 'hooks/client/zod-locales.ts');
config.resolver.resolveRequest = (context, moduleName, platform) => {
  if (/locales\/index\.(js|cjs)$/.test(moduleName) && /[\\/]zod[\\/]v4[\\/]/.test(context.originModulePath)) {
    return { type: 'sourceFile', filePath: zodLocales };
  }
  return context.resolveRequest(context, moduleName, platform);
};
// `expo start --web` during development: the API answers on the same origin, as it does in production.
const api = { host: '127.0.0.1', port: Number(process.env.API_PORT ?? 8080) };
config.server.enhanceMiddleware = (metro) => (req, res, next) => {
  if (!req.url.startsWith('/api/')) return metro(req, res, next);
  const upstream = http.request({ ...api, path: req.url, method: req.method, headers: req.headers }, (answer) => {
    res.writeHead(answer.statusCode, answer.headers);
    answer.pipe(res);
  });
  upstream.on('error', () => {
    res.statusCode = 502;
    res.end('The API server is not running.');
  });
  req.pipe(upstream);
};
module.exports = config;
