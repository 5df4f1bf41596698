// usage: node shoot.mjs MODULES FILE.glb OUT_PREFIX [--chromium PATH] [--variant NAME]... [--orbit "30deg 70deg 105%"]
// Takes pictures of a heatmap in two independent viewers, three.js and model-viewer, in headless
// Chromium: OUT_PREFIX-three.png and OUT_PREFIX-model-viewer[-VARIANT].png. Exits 1 where a page
// reports an error.
// MODULES/node_modules holds three, @google/model-viewer and playwright-core.
import { createServer } from 'node:http';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join, normalize, resolve } from 'node:path';

const WIDE = 1280;
const HIGH = 800;
const [modules, glb, prefix, ...options] = process.argv.slice(2);
const option = (name) => options.flatMap((o, i) => (o === name ? [options[i + 1]] : []));
const chromiumPath = option('--chromium')[0] ?? '/usr/bin/chromium';
const orbit = option('--orbit')[0] ?? 'auto auto auto';
const { chromium } = createRequire(resolve(modules, 'package.json'))('playwright-core');

const style = '<style>html,body{margin:0;height:100%;background:#fff}</style>';
const threePage = `<!doctype html>${style}<body><script type="importmap">{"imports":{
"three":"/modules/three/build/three.module.js","three/addons/":"/modules/three/examples/jsm/"}}</script>
<script type="module">
import * as THREE from 'three';
import { GLTFLoader } from 'three/addons/loaders/GLTFLoader.js';
const renderer = new THREE.WebGLRenderer({ antialias: true });
renderer.setSize(${WIDE}, ${HIGH});
document.body.appendChild(renderer.domElement);
const scene = new THREE.Scene();
scene.background = new THREE.Color(0xffffff);
const { scene: model } = await new GLTFLoader().loadAsync('/model.glb');
scene.add(model);
const sphere = new THREE.Box3().setFromObject(model).getBoundingSphere(new THREE.Sphere());
const camera = new THREE.PerspectiveCamera(30, ${WIDE / HIGH}, sphere.radius / 100, sphere.radius * 20);
const away = new THREE.Vector3(-0.35, 0.35, 1).normalize().multiplyScalar(sphere.radius * 3.4);
camera.position.copy(sphere.center).add(away);
camera.lookAt(sphere.center);
renderer.render(scene, camera);
document.title = 'done';
</script>`;
const modelViewerPage = `<!doctype html>${style}<style>model-viewer{width:100%;height:100%;--progress-bar-color:transparent}</style>
<script type="module" src="/modules/@google/model-viewer/dist/model-viewer.min.js"></script>
<model-viewer src="/model.glb" camera-orbit="${orbit}" interaction-prompt="none"></model-viewer>
<script>document.querySelector('model-viewer').addEventListener('load', () => { document.title = 'done'; });</script>`;

const types = { js: 'text/javascript', glb: 'model/gltf-binary' };
const server = createServer((request, response) => {
  const path = decodeURIComponent(new URL(request.url, 'http://localhost').pathname);
  const page = { '/three': threePage, '/model-viewer': modelViewerPage }[path];
  if (path === '/favicon.ico') {
    response.writeHead(204).end();
    return;
  }
  if (page) {
    response.writeHead(200, { 'Content-Type': 'text/html' }).end(page);
    return;
  }
  const file =
    path === '/model.glb' ? glb : join(modules, 'node_modules', normalize(path.replace(/^\/modules/, '')));
  try {
    const body = readFileSync(file);
    response.writeHead(200, { 'Content-Type': types[file.split('.').pop()] ?? 'text/plain' }).end(body);
  } catch {
    response.writeHead(404).end();
  }
});
await new Promise((listening) => server.listen(0, '127.0.0.1', listening));
const origin = `http://127.0.0.1:${server.address().port}`;

const browser = await chromium.launch({
  executablePath: chromiumPath,
  args: ['--no-sandbox', '--use-angle=swiftshader', '--enable-unsafe-swiftshader',
    '--disable-background-networking', '--disable-component-update', '--no-first-run'],
});
try {
  const page = await browser.newPage({ viewport: { width: WIDE, height: HIGH } });
  const complain = (text) => {
    console.error(text);
    process.exitCode = 1;
  };
  page.on('pageerror', (error) => complain(`page error: ${error}`));
  page.on('console', (m) => m.type() === 'error' && complain(`console error: ${m.text()}`));
  const open = async (name) => {
    await page.goto(`${origin}/${name}`);
    await page.waitForFunction(() => document.title === 'done', null, { timeout: 120000 });
  };
  const shoot = async (suffix) => {
    await page.waitForTimeout(1500);
    const path = `${prefix}-${suffix}.png`;
    await page.screenshot({ path });
    console.log(path);
  };
  await open('three');
  await shoot('three');
  await open('model-viewer');
  const known = await page.$eval('model-viewer', (v) => v.availableVariants);
  console.log(`variants: ${JSON.stringify(known)}`);
  await shoot('model-viewer');
  for (const variant of option('--variant')) {
    await page.$eval('model-viewer', (v, name) => { v.variantName = name; }, variant);
    await shoot(`model-viewer-${variant.replaceAll(/\W+/g, '-')}`);
  }
} finally {
  await browser.close();
  server.close();
}
