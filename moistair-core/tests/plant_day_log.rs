//! The demo log is what its generator makes, here and on any machine.

#[path = "../examples/make_plant_day_log.rs"]
mod make_plant_day_log;

#[test]
fn the_committed_log_is_made_again_byte_for_byte() {
    let made = make_plant_day_log::log().unwrap();
    let committed = include_str!("../examples/plant_day.csv");
    for (line, (made, committed)) in made.lines().zip(committed.lines()).enumerate() {
        assert_eq!(made, committed, "line {}", line + 1);
    }
    assert_eq!(made.len(), committed.len());
    // Header, 24 hours and their end, less the rows that the logger lost, and one twice.
    assert_eq!(made.lines().count(), 1 + 1441 - 30 + 1);
}
