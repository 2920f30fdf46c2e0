//! The hashes that signatures are made over.

use sha2::{Digest as _, Sha256, Sha384, Sha512};

use super::names;

/// A hash of the SHA-2 family.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Hash {
    /// SHA-256.
    Sha256,
    /// SHA-384.
    Sha384,
    /// SHA-512.
    Sha512,
}

impl Hash {
    /// The hash of that name.
    pub fn named(name: &str) -> Option<Self> {
        match name {
            names::SHA256 => Some(Self::Sha256),
            names::SHA384 => Some(Self::Sha384),
            names::SHA512 => Some(Self::Sha512),
            _ => None,
        }
    }

    /// Its name.
    pub const fn name(self) -> &'static str {
        match self {
            Self::Sha256 => names::SHA256,
            Self::Sha384 => names::SHA384,
            Self::Sha512 => names::SHA512,
        }
    }

    /// The digest of pieces, one behind the other.
    pub fn of(self, pieces: &[&[u8]]) -> Vec<u8> {
        match self {
            Self::Sha256 => pieces.iter().fold(Sha256::new(), |h, p| h.chain_update(p)).finalize().to_vec(),
            Self::Sha384 => pieces.iter().fold(Sha384::new(), |h, p| h.chain_update(p)).finalize().to_vec(),
            Self::Sha512 => pieces.iter().fold(Sha512::new(), |h, p| h.chain_update(p)).finalize().to_vec(),
        }
    }
}
