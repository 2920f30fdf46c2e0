//! Many jobs at once: a worker a core, each job on one worker, results in the order of the jobs.
//!
//! One job uses every core by itself. Of many, each keeps to its worker: pieces of a hundred jobs mixed on all
//! cores would hold a hundred jobs' memory at once.

use std::any::Any;
use std::cell::Cell;
use std::panic::{AssertUnwindSafe, catch_unwind};
use std::sync::atomic::{AtomicUsize, Ordering};
use std::sync::mpsc::{RecvTimeoutError, channel};
use std::thread;
use std::time::Duration;

use rayon::ThreadPoolBuilder;

/// Stack of a worker, that of a main thread: templates nest deeply.
const STACK: usize = 8 << 20;
/// How often the caller hears that it still lasts.
const TICK: Duration = Duration::from_millis(100);

/// How many workers `jobs` jobs get.
pub fn workers(jobs: usize) -> usize {
    thread::available_parallelism().map_or(1, usize::from).min(jobs)
}

/// Runs `work` on every item and hands the results to `take` in the order of the items. Meanwhile `idle` is
/// called every tenth of a second. A panic of `work` is the `Err` of that item: where and what, in words.
pub fn in_order<T: Sync, R: Send>(
    items: &[T],
    work: impl Fn(&T) -> R + Sync,
    mut take: impl FnMut(&T, Result<R, String>),
    mut idle: impl FnMut(),
) {
    let next = AtomicUsize::new(0);
    let (sender, results) = channel();
    let pull = |send: &dyn Fn(usize, Result<R, String>)| {
        // Without a pool of its own a worker would share out its pieces on all cores; that is right for one.
        let own =
            (items.len() > 1).then(|| ThreadPoolBuilder::new().num_threads(1).stack_size(STACK).build().ok());
        loop {
            let n = next.fetch_add(1, Ordering::Relaxed);
            let Some(item) = items.get(n) else { break };
            let result = match own.as_ref().and_then(Option::as_ref) {
                Some(pool) => pool.install(|| guarded(|| work(item))),
                None => guarded(|| work(item)),
            };
            send(n, result);
        }
    };
    thread::scope(|scope| {
        let pull = &pull;
        let mut running = 0;
        for _ in 0..workers(items.len()) {
            let sender = sender.clone();
            let worker = move || {
                pull(&|n, result| {
                    let _ = sender.send((n, result));
                });
            };
            running +=
                usize::from(thread::Builder::new().stack_size(STACK).spawn_scoped(scope, worker).is_ok());
        }
        if running == 0 {
            // No thread is to be had: this one does it.
            pull(&|n, result| {
                let _ = sender.send((n, result));
            });
        }
        drop(sender);
        let mut early: Vec<Option<Result<R, String>>> = items.iter().map(|_| None).collect();
        let mut due = 0;
        loop {
            match results.recv_timeout(TICK) {
                Ok((n, result)) => early[n] = Some(result),
                Err(RecvTimeoutError::Timeout) => idle(),
                Err(RecvTimeoutError::Disconnected) => break,
            }
            while let Some(result) = early.get_mut(due).and_then(Option::take) {
                take(&items[due], result);
                due += 1;
            }
        }
    });
}

thread_local! {
    /// Where this thread panicked last.
    static PLACE: Cell<Option<String>> = const { Cell::new(None) };
}

/// Keeps panics off the terminal: [`guarded`] words them. Called once, by the command.
pub fn hush() {
    std::panic::set_hook(Box::new(|info| PLACE.set(info.location().map(ToString::to_string))));
}

/// What `work` yields, or its panic in words.
///
/// # Errors
/// Where and what, when `work` panics.
pub fn guarded<R>(work: impl FnOnce() -> R) -> Result<R, String> {
    PLACE.set(None);
    catch_unwind(AssertUnwindSafe(work)).map_err(|panic| {
        let what = words(&*panic);
        PLACE.take().map_or_else(|| what.clone(), |place| format!("{place}: {what}"))
    })
}

fn words(panic: &(dyn Any + Send)) -> String {
    let text = panic.downcast_ref::<&str>().map(|text| (*text).to_owned());
    text.or_else(|| panic.downcast_ref::<String>().cloned())
        .unwrap_or_else(|| "it stopped without a word".to_owned())
}

#[cfg(test)]
mod tests {
    use super::in_order;

    #[test]
    fn results_come_in_order_and_a_panic_is_one_of_them() {
        let items: Vec<u64> = (0..40).collect();
        let work = |n: &u64| {
            std::thread::sleep(std::time::Duration::from_millis((40 - n) % 7));
            assert!(*n != 13, "the thirteenth");
            n * n
        };
        let mut seen = Vec::new();
        in_order(&items, work, |n, result| seen.push((*n, result)), || {});
        assert_eq!(seen.iter().map(|(n, _)| *n).collect::<Vec<_>>(), items);
        for (n, result) in seen {
            match result {
                Ok(square) => assert_eq!(square, n * n),
                Err(words) => assert!(n == 13 && words.contains("the thirteenth"), "{n}: {words}"),
            }
        }
    }

    #[test]
    fn nothing_to_do_is_done() {
        in_order(&[] as &[u8], |n| *n, |_, _| unreachable!("there is no item"), || {});
    }
}
