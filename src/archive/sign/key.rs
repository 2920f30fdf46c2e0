//! The signer's private key. What is done with it is done by the `rsa`, `p256` and `p384` crates.

use der::asn1::ObjectIdentifier;
use p256::ecdsa::signature::hazmat::PrehashSigner as _;
use pkcs8::der::Decode as _;
use pkcs8::{DecodePrivateKey as _, EncodePublicKey as _, PrivateKeyInfoRef};
use rsa::pkcs1::DecodeRsaPrivateKey as _;
use rsa::traits::PublicKeyParts as _;

use super::hash::Hash;
use super::names;

/// A private key of a kind that signs here. Its memory is wiped when it is dropped.
pub enum PrivateKey {
    /// RSA, 2048 bits or more; signs by PKCS#1 v1.5, which gives the same bytes each time.
    Rsa(Box<rsa::PrivateKey>),
    /// The curve P-256; signs by RFC 6979, which gives the same bytes each time.
    P256(Box<p256::SecretKey>),
    /// The curve P-384, as P-256.
    P384(Box<p384::SecretKey>),
}

/// Why no key was made of some bytes.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum NoKey {
    /// The bytes are no private key.
    Broken,
    /// A key of a kind that does not sign here, in words.
    Kind(String),
}

/// The fewest bits of an RSA key.
const FEWEST_BITS: usize = 2048;

impl PrivateKey {
    /// A key from PKCS#8, its usual form.
    pub fn from_pkcs8(bytes: &[u8]) -> Result<Self, NoKey> {
        let info = PrivateKeyInfoRef::from_der(bytes).map_err(|_| NoKey::Broken)?;
        let kind = info.algorithm.oid.to_string();
        let curve = info.algorithm.parameters_oid().map(|oid| oid.to_string()).unwrap_or_default();
        match (kind.as_str(), curve.as_str()) {
            (names::RSA, _) => Self::rsa(rsa::PrivateKey::from_pkcs8_der(bytes).map_err(|_| NoKey::Broken)?),
            (names::EC, names::P256) => p256::SecretKey::from_pkcs8_der(bytes)
                .map(|k| Self::P256(Box::new(k)))
                .map_err(|_| NoKey::Broken),
            (names::EC, names::P384) => p384::SecretKey::from_pkcs8_der(bytes)
                .map(|k| Self::P384(Box::new(k)))
                .map_err(|_| NoKey::Broken),
            (names::EC, _) => Err(NoKey::Kind(format!("the elliptic curve {curve}"))),
            _ => Err(NoKey::Kind(format!("the algorithm {kind}"))),
        }
    }

    /// A key from PKCS#1, `RSA PRIVATE KEY`.
    pub fn from_pkcs1(bytes: &[u8]) -> Result<Self, NoKey> {
        Self::rsa(rsa::PrivateKey::from_pkcs1_der(bytes).map_err(|_| NoKey::Broken)?)
    }

    /// A key from SEC 1, `EC PRIVATE KEY`.
    pub fn from_sec1(bytes: &[u8]) -> Result<Self, NoKey> {
        let p256 = p256::SecretKey::from_sec1_der(bytes).map(|k| Self::P256(Box::new(k)));
        p256.or_else(|_| p384::SecretKey::from_sec1_der(bytes).map(|k| Self::P384(Box::new(k)))).map_err(
            |_| NoKey::Kind("an elliptic curve other than P-256 and P-384, or a broken key".to_owned()),
        )
    }

    fn rsa(key: rsa::PrivateKey) -> Result<Self, NoKey> {
        let bits = 8 * key.size();
        if bits < FEWEST_BITS {
            return Err(NoKey::Kind(format!("RSA of {bits} bits, fewer than {FEWEST_BITS}")));
        }
        Ok(Self::Rsa(Box::new(key)))
    }

    /// The public key that belongs to it, as a certificate writes it (`SubjectPublicKeyInfo`).
    pub fn public(&self) -> Option<Vec<u8>> {
        match self {
            Self::Rsa(key) => key.to_public_key().to_public_key_der(),
            Self::P256(key) => key.public_key().to_public_key_der(),
            Self::P384(key) => key.public_key().to_public_key_der(),
        }
        .ok()
        .map(|document| document.as_bytes().to_vec())
    }

    /// The hash that goes with the key: as strong as its curve.
    pub const fn hash(&self) -> Hash {
        match self {
            Self::Rsa(_) | Self::P256(_) => Hash::Sha256,
            Self::P384(_) => Hash::Sha384,
        }
    }

    /// The name of its signatures in a CMS, and whether a null stands behind that name.
    pub const fn scheme(&self) -> (ObjectIdentifier, bool) {
        match self {
            Self::Rsa(_) => (ObjectIdentifier::new_unwrap(names::RSA), true),
            Self::P256(_) => (ObjectIdentifier::new_unwrap(names::ECDSA_SHA256), false),
            Self::P384(_) => (ObjectIdentifier::new_unwrap(names::ECDSA_SHA384), false),
        }
    }

    /// The signature of a message.
    pub fn sign(&self, message: &[u8]) -> Option<Vec<u8>> {
        let digest = self.hash().of(&[message]);
        match self {
            Self::Rsa(key) => key.pkcs1v15_sign_prehash::<sha2::Sha256>(&digest).ok(),
            Self::P256(key) => {
                let signature: p256::ecdsa::Signature =
                    p256::ecdsa::SigningKey::from(key.as_ref()).sign_prehash(&digest).ok()?;
                Some(signature.to_der().as_bytes().to_vec())
            }
            Self::P384(key) => {
                let signature: p384::ecdsa::Signature =
                    p384::ecdsa::SigningKey::from(key.as_ref()).sign_prehash(&digest).ok()?;
                Some(signature.to_der().as_bytes().to_vec())
            }
        }
    }
}
