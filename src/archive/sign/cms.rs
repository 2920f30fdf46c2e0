//! The signature itself: a CMS `SignedData` without its content (RFC 5652), as ETSI EN 319 142-1 wants it inside a PDF.
//!
//! Structures are the `cms` crate's; what is computed is computed by [`Hash`] and [`PrivateKey`].

use cms::cert::{CertificateChoices, IssuerAndSerialNumber};
use cms::content_info::{CmsVersion, ContentInfo};
use cms::signed_data::{
    CertificateSet, EncapsulatedContentInfo, SignedData, SignerIdentifier, SignerInfo, SignerInfos,
};
use der::asn1::{ObjectIdentifier, OctetString, SetOfVec};
use der::{Any, Decode as _, Encode as _, Sequence, SliceReader};
use x509_cert::Certificate;
use x509_cert::attr::{Attribute, Attributes};
use x509_cert::spki::AlgorithmIdentifierOwned;

use super::hash::Hash;
use super::signer::Signer;
use super::{names, public};

/// Which certificate, by its digest (RFC 5035): without a name of the hash it is SHA-256.
#[derive(Sequence)]
struct CertificateDigest {
    hash: Option<AlgorithmIdentifierOwned>,
    digest: OctetString,
    issuer_and_serial: Option<Any>,
}

/// The attribute that binds a signature to its certificate.
#[derive(Sequence)]
struct SigningCertificate {
    certificates: Vec<CertificateDigest>,
    policies: Option<Any>,
}

fn algorithm(name: &str, null: bool) -> der::Result<AlgorithmIdentifierOwned> {
    let oid = ObjectIdentifier::new(name).map_err(|_| der::ErrorKind::Failed)?;
    Ok(AlgorithmIdentifierOwned { oid, parameters: null.then(Any::null) })
}

fn attribute(name: &str, value: Any) -> der::Result<Attribute> {
    let oid = ObjectIdentifier::new(name).map_err(|_| der::ErrorKind::Failed)?;
    Ok(Attribute { oid, values: SetOfVec::try_from(vec![value])? })
}

/// The attributes that are signed. The time is none of them: it stands in the PDF's dictionary, inside the signed bytes.
fn attributes(digest: &[u8], certificate: &Certificate) -> der::Result<Attributes> {
    let own = CertificateDigest {
        hash: None,
        digest: OctetString::new(Hash::Sha256.of(&[&certificate.to_der()?]))?,
        issuer_and_serial: None,
    };
    let own = SigningCertificate { certificates: vec![own], policies: None };
    let data = ObjectIdentifier::new(names::DATA).map_err(|_| der::ErrorKind::Failed)?;
    SetOfVec::try_from(vec![
        attribute(names::CONTENT_TYPE, Any::encode_from(&data)?)?,
        attribute(names::MESSAGE_DIGEST, Any::encode_from(&OctetString::new(digest)?)?)?,
        attribute(names::SIGNING_CERTIFICATE, Any::encode_from(&own)?)?,
    ])
}

/// A signature over content with that digest; `None` where the key does not sign, or a certificate does not encode.
pub fn make(digest: &[u8], signer: &Signer) -> Option<Vec<u8>> {
    written(digest, signer).ok().flatten()
}

fn written(digest: &[u8], signer: &Signer) -> der::Result<Option<Vec<u8>>> {
    let certificate = &signer.certificates[0];
    let hash = algorithm(signer.key.hash().name(), false)?;
    let attributes = attributes(digest, certificate)?;
    let Some(signature) = signer.key.sign(&attributes.to_der()?) else { return Ok(None) };
    let (scheme, null) = signer.key.scheme();
    let info = SignerInfo {
        version: CmsVersion::V1,
        sid: SignerIdentifier::IssuerAndSerialNumber(IssuerAndSerialNumber {
            issuer: certificate.tbs_certificate.issuer.clone(),
            serial_number: certificate.tbs_certificate.serial_number.clone(),
        }),
        digest_alg: hash.clone(),
        signed_attrs: Some(attributes),
        signature_algorithm: AlgorithmIdentifierOwned { oid: scheme, parameters: null.then(Any::null) },
        signature: OctetString::new(signature)?,
        unsigned_attrs: None,
    };
    let choices: Vec<_> = signer.certificates.iter().cloned().map(CertificateChoices::Certificate).collect();
    let data = SignedData {
        version: CmsVersion::V1,
        digest_algorithms: SetOfVec::try_from(vec![hash])?,
        encap_content_info: EncapsulatedContentInfo {
            econtent_type: ObjectIdentifier::new(names::DATA).map_err(|_| der::ErrorKind::Failed)?,
            econtent: None,
        },
        certificates: Some(CertificateSet::try_from(choices)?),
        crls: None,
        signer_infos: SignerInfos::try_from(vec![info])?,
    };
    let content_type = ObjectIdentifier::new(names::SIGNED_DATA).map_err(|_| der::ErrorKind::Failed)?;
    ContentInfo { content_type, content: Any::encode_from(&data)? }.to_der().map(Some)
}

/// What a signature says once it is read.
pub struct Read {
    /// The certificate that it names.
    pub certificate: Certificate,
    /// Whether the content has the digest that was signed.
    pub same: bool,
    /// Whether the certificate's key made the signature, over attributes that name this certificate; `None` where key or
    /// scheme is of a kind that is not known here.
    pub made_by_key: Option<bool>,
}

/// Reads a signature over `content`, pieces one behind the other. `None` where it does not read.
pub fn read(bytes: &[u8], content: &[&[u8]]) -> Option<Read> {
    // Its place in the file is longer than it is: noughts follow.
    let info = ContentInfo::decode(&mut SliceReader::new(bytes).ok()?).ok()?;
    if info.content_type.to_string() != names::SIGNED_DATA {
        return None;
    }
    let data: SignedData = info.content.decode_as().ok()?;
    let [signer] = data.signer_infos.0.as_slice() else { return None };
    let SignerIdentifier::IssuerAndSerialNumber(who) = &signer.sid else { return None };
    let is_who = |c: &Certificate| {
        c.tbs_certificate.issuer == who.issuer && c.tbs_certificate.serial_number == who.serial_number
    };
    let certificate = data.certificates?.0.into_vec().into_iter().find_map(|choice| match choice {
        CertificateChoices::Certificate(c) if is_who(&c) => Some(c),
        _ => None,
    })?;
    let hash = Hash::named(&signer.digest_alg.oid.to_string())?;
    let attributes = signer.signed_attrs.as_ref()?;
    let value = |name: &str| {
        let mut of_name = attributes.iter().filter(|a| a.oid.to_string() == name);
        let (Some(one), None) = (of_name.next(), of_name.next()) else { return None };
        let [value] = one.values.as_slice() else { return None };
        Some(value)
    };
    let digest: OctetString = value(names::MESSAGE_DIGEST)?.decode_as().ok()?;
    let kind: ObjectIdentifier = value(names::CONTENT_TYPE)?.decode_as().ok()?;
    let same = digest.as_bytes() == hash.of(content) && kind.to_string() == names::DATA;
    let key = certificate.tbs_certificate.subject_public_key_info.to_der().ok()?;
    let scheme = signer.signature_algorithm.oid.to_string();
    let verified =
        public::verifies(&key, &scheme, hash, &attributes.to_der().ok()?, signer.signature.as_bytes());
    let named = value(names::SIGNING_CERTIFICATE).is_none_or(|v| names_certificate(v, &certificate));
    Some(Read { certificate, same, made_by_key: verified.map(|v| v && named) })
}

/// Whether the attribute names that certificate first.
fn names_certificate(value: &Any, certificate: &Certificate) -> bool {
    let Ok(found) = value.decode_as::<SigningCertificate>() else { return false };
    let Some(first) = found.certificates.first() else { return false };
    let hash = first.hash.as_ref().map_or(Some(Hash::Sha256), |h| Hash::named(&h.oid.to_string()));
    let digest = |hash: Hash| certificate.to_der().map(|bytes| hash.of(&[&bytes]));
    hash.is_some_and(|hash| digest(hash).is_ok_and(|d| d == first.digest.as_bytes()))
}
