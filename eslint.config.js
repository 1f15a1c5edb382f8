const boundaries = require('eslint-plugin-boundaries');
const expo = require('eslint-config-expo/flat');
const { defineConfig } = require('eslint/config');

const wall = (type) => ({ type, pattern: type, mode: 'folder' });

module.exports = defineConfig([
  expo,
  { ignores: ['dist/**', 'node_modules/**', '.rowcall/**', 'public/**'] },
]);
