//! How good the numbers are, measured: makes ACCURACY.md and holds the library to it.
//!
//!     cargo test -p moistair-tests --test accuracy                     # 10 000 points: budgets, and nothing beyond what the page says
//!     MOISTAIR_WRITE_ACCURACY=1 MOISTAIR_CASES=1000000 cargo test --release -p moistair-tests --test accuracy -- --nocapture
//!
//! The second command, the full form, measures a million points and writes the page.

mod measure;
mod page;
mod sample;
mod tables;

use page::Page;

const COMMITTED: &str = include_str!("../../ACCURACY.md");

fn points() -> usize {
    std::env::var("MOISTAIR_CASES")
        .ok()
        .map_or(10_000, |cases| cases.parse().expect("MOISTAIR_CASES is a number"))
        .min(1_000_000)
}

/// Every budget holds, and nothing is worse than the page says: the points of a short run are the first of the full one.
#[test]
fn the_library_is_as_good_as_the_page_says() {
    let page = Page::measure(points());
    println!("{}", page.text());
    page.check_budgets();
    if std::env::var_os("MOISTAIR_WRITE_ACCURACY").is_some() {
        let path = moistair_tests::toolchain::root().join("ACCURACY.md");
        std::fs::write(path, page.text()).expect("ACCURACY.md can be written");
    } else {
        page.check_against(COMMITTED);
    }
}
