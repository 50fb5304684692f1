"""The dump that other faces are compared with: seeded, complete, and mostly of results."""

import bits


def test_dump():
    first = list(bits.lines(40, seed=1))
    assert first == list(bits.lines(40, seed=1)) and first != list(bits.lines(40, seed=2))
    assert len(first) == 40 * len(bits.CASES)
    results = [line.split() for line in first if line.split()[2] == "0"]
    assert len(results) > 0.8 * len(first)
    for name in bits.CASES:
        widths = {len(words) for words in results if words[0] == name}
        assert len(widths) == 1, name


def test_generator():
    """SplitMix64 from seed 0 begins with e220a8397b1dcdaf (from memory; the first output of the published generator)."""
    assert next(bits.shares(0)) == (0xE220A8397B1DCDAF >> 11) * 2.0**-53
