//! Signatures held against a public key, by the `rsa`, `p256` and `p384` crates.

use p256::ecdsa::signature::hazmat::PrehashVerifier as _;
use pkcs8::DecodePublicKey as _;

use super::hash::Hash;
use super::names;

/// Whether the owner of `key` (`SubjectPublicKeyInfo`) signed `message`; `None` where key or scheme is of a kind that is not
/// known here, or the scheme wants another hash than the one that is said.
pub fn verifies(key: &[u8], scheme: &str, said: Hash, message: &[u8], signature: &[u8]) -> Option<bool> {
    let (rsa, hash) = match scheme {
        names::RSA => (true, said),
        names::RSA_SHA256 => (true, Hash::Sha256),
        names::RSA_SHA384 => (true, Hash::Sha384),
        names::RSA_SHA512 => (true, Hash::Sha512),
        names::ECDSA_SHA256 => (false, Hash::Sha256),
        names::ECDSA_SHA384 => (false, Hash::Sha384),
        names::ECDSA_SHA512 => (false, Hash::Sha512),
        _ => return None,
    };
    if hash != said {
        return None;
    }
    let digest = hash.of(&[message]);
    if rsa {
        let key = rsa::PublicKey::from_public_key_der(key).ok()?;
        let verified = match hash {
            Hash::Sha256 => key.pkcs1v15_verify_prehash::<sha2::Sha256>(&digest, signature),
            Hash::Sha384 => key.pkcs1v15_verify_prehash::<sha2::Sha384>(&digest, signature),
            Hash::Sha512 => key.pkcs1v15_verify_prehash::<sha2::Sha512>(&digest, signature),
        };
        return Some(verified.is_ok());
    }
    if let Ok(key) = p256::ecdsa::VerifyingKey::from_public_key_der(key) {
        let read = p256::ecdsa::Signature::from_der(signature);
        return Some(read.is_ok_and(|s| key.verify_prehash(&digest, &s).is_ok()));
    }
    let key = p384::ecdsa::VerifyingKey::from_public_key_der(key).ok()?;
    let read = p384::ecdsa::Signature::from_der(signature);
    Some(read.is_ok_and(|s| key.verify_prehash(&digest, &s).is_ok()))
}
