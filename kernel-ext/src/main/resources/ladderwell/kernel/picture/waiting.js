(function (w, p) {
  var d = w.document;
  (w.ladderwellPictures = w.ladderwellPictures || []).push(p);
  w.setTimeout(function () {
    if (w.ladderwellPlayer) return;
    var n = w.Jupyter && w.Jupyter.notebook, c = n && n.kernel && n.kernel.comm_manager;
    if (c && !w.ladderwellAsked) {
      w.ladderwellAsked = true;
      c.new_comm('ladderwell.library', {}).on_msg(function (m) {
        var s = d.createElement('script');
        s.textContent = m.content.data.script;
        d.head.appendChild(s);
      });
    }
    w.setTimeout(function () {
      if (w.ladderwellPlayer) return;
      var h = d.querySelector('[data-ladderwell="' + p.key + '"] .lw-hint');
      if (h) h.hidden = false;
    }, c ? 2500 : 0);
  }, 2000);
})(window, 
