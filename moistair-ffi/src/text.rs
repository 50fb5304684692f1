//! Texts of the core as static C strings, made at compile time.

/// Room for the longest text and its terminator.
const ROOM: usize = 64;

/// A text, terminated.
#[derive(Clone, Copy)]
pub(crate) struct Text([u8; ROOM]);

impl Text {
    /// The empty text.
    pub const EMPTY: Self = Self([0; ROOM]);

    /// A text as it is. Fails to compile when it is too long.
    pub const fn new(text: &str) -> Self {
        Self::with(text, false)
    }

    /// A text as a name: underscores for spaces and hyphens.
    pub const fn name(text: &str) -> Self {
        Self::with(text, true)
    }

    #[allow(clippy::indexing_slicing, reason = "evaluated at compile time only")]
    const fn with(text: &str, name: bool) -> Self {
        let (source, mut bytes) = (text.as_bytes(), [0; ROOM]);
        assert!(source.len() < ROOM);
        let mut i = 0;
        while i < source.len() {
            bytes[i] = match source[i] {
                b' ' | b'-' if name => b'_',
                byte => byte,
            };
            i += 1;
        }
        Self(bytes)
    }

    /// The C string.
    pub const fn as_ptr(&'static self) -> *const core::ffi::c_char {
        self.0.as_ptr().cast()
    }
}

/// A static table of the texts of an enumeration, in the order of its `ALL`.
macro_rules! texts {
    ($type:ty, $make:path, $method:ident) => {{
        const TEXTS: [$crate::text::Text; <$type>::ALL.len()] = {
            let mut texts = [$crate::text::Text::EMPTY; <$type>::ALL.len()];
            let mut i = 0;
            while i < texts.len() {
                #[allow(clippy::indexing_slicing, reason = "evaluated at compile time only")]
                {
                    texts[i] = $make(<$type>::ALL[i].$method());
                }
                i += 1;
            }
            texts
        };
        static TABLE: [$crate::text::Text; <$type>::ALL.len()] = TEXTS;
        &TABLE
    }};
}
pub(crate) use texts;
