// Shows how the last build went and loads the pages anew after each good one. The pages themselves hold no script.
const standing = document.getElementById('standing');
const problems = document.getElementById('problems');
const pages = document.getElementById('pages');
let shown = 0;

const events = new EventSource('/-/events');
events.onmessage = ({ data }) => {
  const state = JSON.parse(data);
  standing.textContent = state.standing;
  document.title = state.failed ? 'Preview: problems' : 'Preview';
  problems.textContent = state.problems;
  problems.hidden = state.problems === '';
  if (state.page === null || state.good === shown) return;
  shown = state.good;
  if (pages.hidden) {
    pages.src = state.page;
    pages.hidden = false;
  } else pages.contentWindow.location.reload();
};
events.onerror = () => {
  standing.textContent = 'The preview has been stopped, or cannot be reached.';
};
