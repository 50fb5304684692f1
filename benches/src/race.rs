//! Timing in turns: in each round every contender runs once, so that what else the machine does meets all of them.

use std::time::Duration;

/// A time of a pass is taken over at least this long.
const SAMPLE: Duration = Duration::from_millis(2);
/// Of a race, about.
const BUDGET: Duration = Duration::from_secs(30);

pub struct Contender<'a> {
    pub name: String,
    calls: usize,
    passes: usize,
    run: Box<dyn FnMut(usize) -> Duration + 'a>,
    /// ns per call, one a round.
    rounds: Vec<f64>,
}

#[derive(Default)]
pub struct Race<'a> {
    pub contenders: Vec<Contender<'a>>,
}

impl<'a> Race<'a> {
    /// A contender whose pass makes so many calls.
    pub fn enter(&mut self, name: impl Into<String>, calls: usize, mut pass: impl FnMut() + 'a) {
        self.enter_timed(name, calls, move |passes| {
            let start = processor_time();
            (0..passes).for_each(|_| pass());
            processor_time().saturating_sub(start)
        });
    }

    /// A contender that times its passes itself.
    pub fn enter_timed(&mut self, name: impl Into<String>, calls: usize, run: impl FnMut(usize) -> Duration + 'a) {
        self.contenders.push(Contender { name: name.into(), calls, passes: 1, run: Box::new(run), rounds: vec![] });
    }

    /// One round to warm up and to choose the number of passes, then the rounds that count, every other one backwards. Fewer rounds,
    /// but at least three, if so many would take much longer than `BUDGET`. Returns how many.
    pub fn run(&mut self, rounds: usize) -> usize {
        let mut round = Duration::ZERO;
        for contender in &mut self.contenders {
            let once = (contender.run)(1).max(Duration::from_nanos(1));
            contender.passes = (SAMPLE.as_nanos() / once.as_nanos()) as usize + 1;
            round += once * contender.passes as u32;
        }
        let rounds = rounds.min((BUDGET.as_nanos() / round.as_nanos().max(1)) as usize).max(3);
        for round in 0..rounds {
            let mut turn = |contender: &mut Contender| {
                let time = (contender.run)(contender.passes);
                contender.rounds.push(time.as_secs_f64() * 1e9 / (contender.passes * contender.calls) as f64);
            };
            if round % 2 == 0 {
                self.contenders.iter_mut().for_each(&mut turn);
            } else {
                self.contenders.iter_mut().rev().for_each(&mut turn);
            }
        }
        rounds
    }

    pub fn find(&self, name: &str) -> Option<&Contender<'a>> {
        self.contenders.iter().find(|contender| contender.name == name)
    }
}

impl Contender<'_> {
    /// ns per call: median of the rounds.
    pub fn median(&self) -> f64 {
        median(self.rounds.clone())
    }

    /// ns per call: the quickest round.
    pub fn least(&self) -> f64 {
        self.rounds.iter().copied().fold(f64::INFINITY, f64::min)
    }

    /// Time over that of another: median of the rounds' ratios.
    pub fn ratio(&self, other: &Contender) -> f64 {
        median(self.rounds.iter().zip(&other.rounds).map(|(a, b)| a / b).collect())
    }
}

/// Processor time of this thread: other programs' turns on the processor do not count.
#[cfg(unix)]
fn processor_time() -> Duration {
    let mut time = libc::timespec { tv_sec: 0, tv_nsec: 0 };
    // SAFETY: writes to the structure that it is given.
    let status = unsafe { libc::clock_gettime(libc::CLOCK_THREAD_CPUTIME_ID, &mut time) };
    assert_eq!(status, 0, "this system has no clock of processor time");
    Duration::new(time.tv_sec as u64, time.tv_nsec as u32)
}

/// Elsewhere the time of day.
#[cfg(not(unix))]
fn processor_time() -> Duration {
    std::time::SystemTime::now().duration_since(std::time::UNIX_EPOCH).unwrap_or_default()
}

fn median(mut values: Vec<f64>) -> f64 {
    values.sort_by(f64::total_cmp);
    values.get(values.len() / 2).copied().unwrap_or(f64::NAN)
}
