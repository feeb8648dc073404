'use strict';

// The page of `coldseam watch`: waits for scenes and shows them. Asks nobody but its own server.
const part = (id) => document.getElementById(id);
const made = (tag, text, style) => {
  const element = document.createElement(tag);
  element.textContent = text;
  if (style) element.className = style;
  return element;
};
const captions = { section: 'Section', temperature: 'Temperatures' };
let latest = 0;

function showMistakes(mistakes) {
  const box = part('mistakes');
  box.replaceChildren();
  box.hidden = mistakes.length === 0;
  if (box.hidden) return;
  box.append(made('h2', mistakes.length === 1 ? 'One mistake' : mistakes.length + ' mistakes'));
  for (const mistake of mistakes) {
    const words = made('p', '');
    if (mistake.place) words.append(made('span', mistake.place, 'place'), ' ');
    words.append(mistake.wrong + (mistake.right ? '; ' + mistake.right : ''));
    box.append(words);
    if (mistake.line) box.append(made('pre', mistake.line));
  }
}

// The old pictures stay until the new ones are ready, so that nothing flickers.
async function picture(name, scene) {
  const image = new Image();
  image.alt = (captions[name] || name) + ' of ' + scene.title;
  image.src = '/' + name + '.svg?' + scene.number;
  await image.decode();
  return image;
}

async function show(scene) {
  latest = scene.number;
  document.title = scene.title + ' · Coldseam';
  part('title').textContent = scene.title;
  document.body.classList.remove('apart');
  document.body.classList.toggle('solving', scene.state === 'solving');
  if (scene.state === 'solving') return;
  let images = [];
  try {
    images = await Promise.all(scene.pictures.map((name) => picture(name, scene)));
  } catch (e) {
    if (scene.number !== latest) return;
    throw e;
  }
  if (scene.number !== latest) return;
  part('told').textContent = scene.told;
  part('pictures').replaceChildren(...images);
  part('card').textContent = scene.card;
  part('remarks').replaceChildren(...scene.remarks.map((remark) => made('li', remark)));
  part('remarks').hidden = scene.remarks.length === 0;
  showMistakes(scene.mistakes);
  document.body.dataset.shown = scene.number;
}

const events = new EventSource('/events');
events.addEventListener('scene', (event) => show(JSON.parse(event.data)));
events.addEventListener('over', () => {
  events.close();
  document.body.classList.remove('solving');
  document.body.classList.add('apart');
  part('told').textContent = 'coldseam watch has ended; this is what it showed last';
});
events.addEventListener('error', () => {
  if (events.readyState === EventSource.CLOSED) return;
  document.body.classList.add('apart');
  part('told').textContent = 'no connection; trying again';
});
