const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);
const resolveBefore = config.resolver.resolveRequest;

// zod brings the words of its errors in some fifty languages; the client speaks English only.
const zodLocales = /^\.\.\/locales\/index\.(js|cjs)$/;

config.resolver.resolveRequest = (context, name, platform) => {
  const resolve = resolveBefore ?? context.resolveRequest;
  const wanted =
    zodLocales.test(name) && /[\\/]zod[\\/]/.test(context.originModulePath) ? name.replace('index', 'en') : name;
  return resolve(context, wanted, platform);
};

module.exports = config;
