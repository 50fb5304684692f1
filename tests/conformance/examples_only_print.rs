//! The three programs of the main job read, call and print: no arithmetic on readings, which could differ between them.
//!
//! The scan sees tokens, not types: every `+ − * / %` between two operands, every increment, and every call of a mathematical
//! function is found, in code and inside f-strings, and has to stand in the list of exceptions below. Those count rows and move
//! pointers.

use std::fs;

use moistair_tests::toolchain::root;

#[derive(Clone, Copy, PartialEq)]
enum Language {
    Rust,
    C,
    Python,
}
use Language::{C, Python, Rust};

const PROGRAMS: [(&str, Language, &[&str]); 3] = [
    (
        "moistair-core/examples/plant_day.rs",
        Rust,
        &[
            // A repetition in a macro.
            ") * COUNT",
            // Rows of the log.
            "rows += 1",
            "unreadable += 1",
            "not_in_time += 1",
        ],
    ),
    (
        "moistair-ffi/examples/plant_day.c",
        C,
        &[
            // Loops over arrays, text and the fields of a line.
            "channels ++",
            "i ++",
            "line ++",
            "rate ++",
            "reason ++",
            "text ++",
            "field ++",
            "shown ++",
            "width --",
            "count ++",
            "pairs / sizeof",
            // A cast, not a product.
            ") * text",
            // The time stands before the readings.
            "1 + CHANNELS",
            "1 + i",
            // Rows and hours of the log.
            "rows ++",
            "unreadable ++",
            "not_in_time ++",
            "hours ++",
        ],
    ),
    ("moistair-py/examples/plant_day.py", Python, &[]),
];

/// Reads the three programs.
pub fn no_arithmetic() {
    for (path, language, allowed) in PROGRAMS {
        let source = fs::read_to_string(root().join(path)).unwrap();
        let found = arithmetic(&source, language);
        let others: Vec<_> = found.iter().filter(|(_, what)| !allowed.contains(&what.as_str())).collect();
        assert!(others.is_empty(), "{path}: line and what it calculates: {others:?}");
        for exception in allowed {
            assert!(found.iter().any(|(_, what)| what == exception), "{path}: no longer there: {exception}");
        }
    }
}

/// The scan finds what it is for, and nothing else.
pub fn finds_arithmetic() {
    let cases: [(Language, &str, &[&str]); 13] = [
        (Rust, "let x = a.value() * 3.6; // a + b", &[") * 3.6"]),
        (Rust, "let y: &'static str = \"a + b\"; let z = -1.0; let c = '+'; *raw = f(&x, *y)?;", &[]),
        (Rust, "sum -= readings[i] % 2", &["sum -= readings", "] % 2"]),
        (Rust, "fn f() -> f64 { x.powi(2) } use core::ops::Add; use a::*;", &["powi (", "ops ::"]),
        (C, "double *p = &x; const struct span *s; s->a - b; (void)(x/y);", &["a - b", "x / y"]),
        (C, "/* a + b */ printf(\"%d - %d\", fabs(x), i++, sizeof(int));", &["fabs (", "i ++"]),
        (C, "#include <a-b.h>\nf(moistair_state *state, void *, -1.0)", &[]),
        (C, "t = (t32 - 32.0) * 5.0 / 9.0;", &["t32 - 32.0", ") * 5.0", "5.0 / 9.0"]),
        (Python, "f(*cells, **names)  # a + b\nx = -1e-3\nd: Callable[[], None]", &[]),
        (Python, "print(f\"{a/b:>6.2f} - {c} {d:{w - 1}}\", 'a-b', \"\"\"a * b\"\"\")", &["a / b", "w - 1"]),
        (Python, "x = a @ b\n@property\ndef f(x) -> float:\n    return -x\n", &["a @ b"]),
        (Python, "np.where(x > 0.0, x, 0.0); np.mean(x); sum(x)", &["np . mean", "sum ("]),
        (Python, "a ** 2 // b; f\"{{a-b}} {c}\"", &["a ** 2", "2 // b"]),
    ];
    for (language, source, expected) in cases {
        let found: Vec<_> = arithmetic(source, language).into_iter().map(|(_, what)| what).collect();
        assert_eq!(found, expected, "{source}");
    }
}

const OPERATORS: [&str; 17] =
    ["+", "-", "*", "/", "%", "**", "//", "+=", "-=", "*=", "/=", "%=", "**=", "//=", "++", "--", "@"];

/// What stands before an operand, or where none follows.
const KEYWORDS: [&str; 21] = [
    "and", "as", "case", "const", "else", "elif", "fn", "for", "if", "in", "let", "match", "mod", "mut", "not", "or",
    "pub", "return", "while", "yield", "lambda",
];

/// Functions that calculate, where they are called.
const FUNCTIONS: [&str; 31] = [
    "abs",
    "fabs",
    "sqrt",
    "pow",
    "powi",
    "powf",
    "exp",
    "ln",
    "log",
    "mul_add",
    "fma",
    "fmod",
    "floor",
    "ceil",
    "round",
    "trunc",
    "min",
    "max",
    "fmin",
    "fmax",
    "clamp",
    "sum",
    "fsum",
    "product",
    "divmod",
    "rem_euclid",
    "div_euclid",
    "wrapping_add",
    "saturating_add",
    "checked_add",
    "hypot",
];

/// What Python may take from NumPy: containers, choices and tests.
const NUMPY: [&str; 7] = ["array", "float64", "maximum", "where", "isnan", "isfinite", "count_nonzero"];

/// Every place that calculates: its line and the tokens around.
fn arithmetic(source: &str, language: Language) -> Vec<(usize, String)> {
    let tokens = tokens(source, language);
    let text = |i: usize| tokens.get(i).map_or("", |(_, token)| token.as_str());
    let mut found = Vec::new();
    for (i, (line, token)) in tokens.iter().enumerate() {
        let (before, after) = (if i > 0 { text(i - 1) } else { "" }, text(i + 1));
        let what = if OPERATORS.contains(&token.as_str()) {
            let declares = language == C && token == "*" && is_type(before, if i > 1 { text(i - 2) } else { "" });
            let increments = matches!(token.as_str(), "++" | "--");
            let binary = ends_operand(before) && starts_operand(after) && !declares;
            (binary || increments).then(|| format!("{before} {token} {after}"))
        } else if FUNCTIONS.contains(&token.as_str()) {
            (after == "(" && before != "fn" && before != "def").then(|| format!("{token} ("))
        } else if token == "np" && after == "." {
            (!NUMPY.contains(&text(i + 2))).then(|| format!("np . {}", text(i + 2)))
        } else {
            (token == "ops" && after == "::").then(|| "ops ::".to_owned())
        };
        // What an increment is followed by says nothing.
        let what = what
            .map(|what| if what.contains("++") || what.contains("--") { format!("{before} {token}") } else { what });
        found.extend(what.map(|what| (*line, what)));
    }
    found
}

fn is_word(token: &str) -> bool {
    token.starts_with(|c: char| c.is_alphanumeric() || c == '_') && !KEYWORDS.contains(&token)
}

fn ends_operand(token: &str) -> bool {
    is_word(token) || matches!(token, ")" | "]" | "?" | "\"")
}

fn starts_operand(token: &str) -> bool {
    is_word(token) || matches!(token, "(" | "[" | "-" | "*" | "&" | "!" | "\"")
}

/// Whether a star behind this word declares a pointer.
fn is_type(word: &str, before: &str) -> bool {
    before == "struct"
        || word.starts_with("moistair_")
        || ["char", "void", "double", "int", "uint64_t", "FILE"].contains(&word)
}

/// The tokens with their lines, without comments; a string is one token `"`, with the expressions of an f-string behind it.
fn tokens(source: &str, language: Language) -> Vec<(usize, String)> {
    let mut lexer = Lexer { rest: source, line: 1, language, tokens: Vec::new() };
    while lexer.next() {}
    lexer.tokens
}

struct Lexer<'a> {
    rest: &'a str,
    line: usize,
    language: Language,
    tokens: Vec<(usize, String)>,
}

impl<'a> Lexer<'a> {
    fn take(&mut self, bytes: usize) -> &'a str {
        let (taken, rest) = self.rest.split_at(bytes);
        self.rest = rest;
        self.line += taken.matches('\n').count();
        taken
    }

    fn push(&mut self, token: &str) {
        self.tokens.push((self.line, token.to_owned()));
    }

    fn length(&self, of: impl Fn(char) -> bool) -> usize {
        self.rest.find(|c| !of(c)).unwrap_or(self.rest.len())
    }

    /// Up to and including an end.
    fn until(&self, from: usize, end: &str) -> usize {
        self.rest[from..].find(end).map_or(self.rest.len(), |found| from + found + end.len())
    }

    fn next(&mut self) -> bool {
        let Some(first) = self.rest.chars().next() else { return false };
        let line_comment = match self.language {
            Python => self.rest.starts_with('#'),
            // Directives of the preprocessor, too.
            C => self.rest.starts_with('#') || self.rest.starts_with("//"),
            Rust => self.rest.starts_with("//"),
        };
        if first.is_whitespace() {
            self.take(first.len_utf8());
        } else if line_comment {
            self.take(self.until(0, "\n"));
        } else if self.language != Python && self.rest.starts_with("/*") {
            self.take(self.until(2, "*/"));
        } else if let Some((prefix, quote)) = self.string() {
            self.text(prefix, quote);
        } else if first == '\'' {
            // A character of Rust or C, or a lifetime.
            let escaped = self.rest[1..].starts_with('\\');
            let quoted = self.rest.chars().nth(2) == Some('\'');
            let bytes = if escaped {
                self.until(3, "'")
            } else if quoted {
                self.until(2, "'")
            } else {
                1
            };
            self.take(bytes);
        } else if first.is_ascii_digit() {
            let word = self.number();
            let taken = self.take(word);
            self.push(taken);
        } else if first.is_alphabetic() || first == '_' {
            let word = self.length(|c| c.is_alphanumeric() || c == '_');
            let taken = self.take(word);
            self.push(taken);
        } else {
            self.operator();
        }
        true
    }

    /// Prefix and quote of a string that begins here.
    fn string(&self) -> Option<(&'a str, &'static str)> {
        let word = self.length(|c| c.is_ascii_alphabetic());
        let (prefix, rest) = self.rest.split_at(word);
        let quotes: &[&str] = if self.language == Python { &["\"\"\"", "'''", "\"", "'"] } else { &["\""] };
        let quote = quotes.iter().find(|quote| rest.starts_with(**quote))?;
        (word <= 2).then_some((prefix, *quote))
    }

    fn text(&mut self, prefix: &str, quote: &str) {
        let opening = prefix.len() + quote.len();
        let mut end = opening;
        while end < self.rest.len() && !self.rest[end..].starts_with(quote) {
            let escape = self.rest[end..].starts_with('\\');
            let mut characters = self.rest[end..].chars();
            end += characters.next().map_or(0, char::len_utf8);
            end += if escape { characters.next().map_or(0, char::len_utf8) } else { 0 };
        }
        self.push("\"");
        let body = &self.rest[opening..end];
        if self.language == Python && prefix.to_lowercase().contains('f') {
            for expression in expressions(body) {
                let line = self.line;
                self.push(";");
                self.tokens.extend(tokens(&expression, Python).into_iter().map(|(_, token)| (line, token)));
                self.push(";");
            }
        }
        self.take((end + quote.len()).min(self.rest.len()));
    }

    fn number(&self) -> usize {
        let mut bytes = 0;
        let mut before = ' ';
        for c in self.rest.chars() {
            let exponent = matches!(c, '+' | '-') && matches!(before, 'e' | 'E') && !self.rest.starts_with("0x");
            let range = c == '.' && self.rest[bytes + 1..].starts_with(['.', '_']);
            if !(c.is_alphanumeric() || c == '_' || c == '.' || exponent) || range {
                break;
            }
            bytes += c.len_utf8();
            before = c;
        }
        bytes
    }

    fn operator(&mut self) {
        let three = ["**=", "//=", "..="];
        let two =
            ["->", "=>", "++", "--", "+=", "-=", "*=", "/=", "%=", "::", "==", "!=", "<=", ">=", "&&", "||", "//"];
        let language = self.language;
        let many = three.iter().chain(&two).chain(["**"].iter().filter(|_| language == Python));
        let found = many.copied().find(|token| self.rest.starts_with(token));
        let bytes = found.map_or_else(|| self.rest.chars().next().map_or(0, char::len_utf8), str::len);
        let begins = self.tokens.last().is_none_or(|(line, _)| *line < self.line);
        let taken = self.take(bytes);
        // A decorator.
        self.push(if taken == "@" && begins { ";" } else { taken });
    }
}

/// What an f-string evaluates: each expression in braces, and those in its format.
fn expressions(body: &str) -> Vec<String> {
    let mut found: Vec<String> = Vec::new();
    let mut open: Vec<(String, bool)> = Vec::new();
    let mut characters = body.chars().peekable();
    while let Some(c) = characters.next() {
        match c {
            // A brace that is text.
            '{' | '}' if open.is_empty() && characters.peek() == Some(&c) => drop(characters.next()),
            '{' => open.push((String::new(), false)),
            '}' => found.extend(open.pop().map(|(expression, _)| expression)),
            _ => {
                if let Some((expression, formatting)) = open.last_mut() {
                    *formatting |= c == ':' || c == '!';
                    if !*formatting {
                        expression.push(c);
                    }
                }
            }
        }
    }
    found
}
