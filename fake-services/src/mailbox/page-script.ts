/** What the page does by itself: fits the mail's frame, sends its links to new tabs, tells of newer mail. */
export const pageScript = `
const frame = document.querySelector('iframe.frame');

function fit() {
  const mail = frame.contentDocument;
  if (!mail || !mail.body) return;
  for (const link of mail.links) {
    link.target = '_blank';
    link.rel = 'noopener noreferrer';
  }
  frame.style.height = 'auto';
  frame.style.height = mail.documentElement.scrollHeight + 2 + 'px';
}

if (frame) {
  frame.addEventListener('load', fit);
  window.addEventListener('resize', fit);
  if (frame.contentDocument && frame.contentDocument.readyState === 'complete') fit();
}

async function lookForMail() {
  if (document.hidden) return;
  try {
    const { newest } = await (await fetch('/api/summary')).json();
    document.getElementById('fresh').hidden = newest === null || newest === document.body.dataset.newest;
  } catch {
    // The mailbox is down or starting again: the next look finds it.
  }
}

setInterval(lookForMail, 3000);
`;
