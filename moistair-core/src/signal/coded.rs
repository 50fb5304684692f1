//! Enumerations that cross the C interface as integers.

/// Declares a fieldless enumeration with fixed codes and texts; a code is never used twice.
macro_rules! coded_enum {
    ($(#[$meta:meta])* $name:ident { $($(#[$doc:meta])* $variant:ident = $code:literal, $text:literal;)+ }) => {
        $(#[$meta])*
        #[repr(i32)]
        #[non_exhaustive]
        #[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum $name {
            $($(#[$doc])* $variant = $code,)+
        }

        impl $name {
            /// All of them, in the order of their codes.
            pub const ALL: [Self; [$($code),+].len()] = [$(Self::$variant),+];

            /// The number that stands for it on the C and Python faces. It never changes.
            #[must_use]
            pub const fn code(self) -> i32 {
                self as i32
            }

            /// The one with this [`code`](Self::code), or `None`.
            #[must_use]
            pub const fn from_code(code: i32) -> Option<Self> {
                match code {
                    $($code => Some(Self::$variant),)+
                    _ => None,
                }
            }

            /// A short text, lower case.
            #[must_use]
            pub const fn text(self) -> &'static str {
                match self {
                    $(Self::$variant => $text,)+
                }
            }
        }

        impl core::fmt::Display for $name {
            fn fmt(&self, f: &mut core::fmt::Formatter<'_>) -> core::fmt::Result {
                f.pad(self.text())
            }
        }
    };
}

pub(crate) use coded_enum;
