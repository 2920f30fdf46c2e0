//! How far a call with several jobs is.

use std::time::{Duration, Instant};

/// A progress bar on a terminal, for several jobs that take longer than half a second.
pub(super) struct Progress {
    bar: indicatif::ProgressBar,
    begin: Instant,
}

impl Progress {
    pub(super) fn new(jobs: usize) -> Self {
        let bar = indicatif::ProgressBar::with_draw_target(
            Some(jobs as u64),
            indicatif::ProgressDrawTarget::hidden(),
        );
        bar.set_style(
            indicatif::ProgressStyle::with_template("{pos} of {len} packs  {wide_bar}")
                .unwrap_or_else(|_| indicatif::ProgressStyle::default_bar()),
        );
        Self { bar, begin: Instant::now() }
    }

    /// Called now and then: shows the bar once it has lasted long enough.
    pub(super) fn tick(&self) {
        let several = self.bar.length().is_some_and(|jobs| jobs > 1);
        if self.bar.is_hidden() && several && self.begin.elapsed() > Duration::from_millis(500) {
            self.bar.set_draw_target(indicatif::ProgressDrawTarget::stderr());
        }
        self.bar.tick();
    }

    pub(super) fn one_more(&self) {
        self.bar.inc(1);
        self.tick();
    }

    pub(super) fn aside(&self, say: impl FnOnce()) {
        self.bar.suspend(say);
    }

    pub(super) fn end(&self) {
        self.bar.finish_and_clear();
    }
}
